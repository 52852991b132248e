import { View } from 'react-native';
import { colour, space, Text } from '@/features/ui';
import { BarlineMark } from './barline-mark';
import { type OrbitState, stateLook } from './orbit-state';

export interface BarlineStateProps {
  state: OrbitState;
  /** Distance of two lines, px. */
  lineGap?: number;
  width?: number;
  /** Another word than the state's own; `null`: the word stands elsewhere. */
  word?: string | null;
  /** Draw the bar once, as when it changes. */
  animate?: boolean;
}

/** A piece of staff with its closing barline, and the word: a key to the marks. */
export function BarlineState({ state, lineGap = 8, width = 120, word, animate = false }: BarlineStateProps) {
  const top = 2;
  const bottom = top + 4 * lineGap;
  const lines = [0, 1, 2, 3, 4].map((i) => `M0 ${top + i * lineGap}H${width}`).join('');
  return (
    <View style={{ gap: space.half }}>
      <svg width={width} height={bottom + 2} aria-hidden>
        <path d={lines} stroke={colour.staff} strokeWidth={0.8} />
        <BarlineMark state={state} x={width} top={top} bottom={bottom} animate={animate} />
      </svg>
      {word === null ? null : (
        <Text size={14} tone={stateLook[state].tone}>
          {word ?? stateLook[state].word}
        </Text>
      )}
    </View>
  );
}
