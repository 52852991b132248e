import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Svg } from 'react-native-svg';
import { CrossingWalk } from '@/features/notation/crossing-walk';
import { pressedCrossing } from './pressed-crossing';

export interface PlotPictureProps {
  width: number;
  height: number;
  /** The text alternative. */
  words: string;
  /** Crossings, px; with `onSelect` they can be walked and pressed. */
  marks: readonly { x: number; y: number }[];
  selected?: number | null;
  onSelect?: (crossing: number) => void;
  valueText?: (crossing: number) => string;
  children: ReactNode;
}

/** The picture of a plot, with its text alternative, its keys and its presses. */
export function PlotPicture(props: PlotPictureProps) {
  const { width, height, words, marks, selected = null, onSelect, valueText, children } = props;
  const picture = (
    <Svg width={width} height={height} aria-hidden>
      {children}
    </Svg>
  );
  if (!onSelect || marks.length === 0) {
    return (
      <View role="img" aria-label={words}>
        {picture}
      </View>
    );
  }
  return (
    <CrossingWalk
      name={words}
      count={marks.length}
      selected={selected}
      onSelect={onSelect}
      valueText={valueText ?? ((crossing) => `crossing ${crossing + 1}`)}
      onPress={(event) => {
        const crossing = pressedCrossing(event, marks);
        if (crossing !== null) onSelect(crossing);
      }}
    >
      {picture}
    </CrossingWalk>
  );
}
