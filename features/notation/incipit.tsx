import { type MouseEvent, type ReactNode, useState } from 'react';
import { View } from 'react-native';
import { colour } from '@/features/ui';
import { BarlineMark } from './barline-mark';
import { Clef } from './clef';
import { CrossingWalk } from './crossing-walk';
import { incipitFlow } from './incipit-flow';
import { incipitHeight, type IncipitLayout, incipitLayout } from './incipit-layout';
import { CutMark, EndMark, LettersMark, NotesMark, RingMark, StaffMark } from './incipit-marks';
import type { IncipitProps } from './incipit-props';
import { incipitWords } from './incipit-words';

/** In staff spaces. */
const CLEF_RADIUS = 1.25;
const CLEF_FROM_LEFT = 3.1;

function Drawing({ props, layout }: { props: IncipitProps; layout: IncipitLayout }) {
  const { levels, levelLabels, showLetters, state, multipliers = null, end, selected, animate = false } = props;
  const { left, top, bottom, space, width, height } = layout;
  return (
    <svg width={width} height={height} aria-hidden>
      <StaffMark layout={layout} levels={levelLabels ? levels : null} />
      <Clef
        multipliers={multipliers}
        radius={CLEF_RADIUS * space}
        x={left + CLEF_FROM_LEFT * space}
        y={(top + bottom) / 2}
      />
      <path d={incipitFlow(props, layout)} fill="none" stroke={colour.muted} strokeWidth={1} strokeLinejoin="round" />
      <NotesMark layout={layout} />
      {showLetters ? <LettersMark layout={layout} /> : null}
      <EndMark layout={layout} end={end} />
      {layout.cut ? (
        <CutMark layout={layout} state={state} />
      ) : (
        <BarlineMark state={state} x={width} top={top - 0.4} bottom={bottom + 0.4} animate={animate} />
      )}
      <RingMark layout={layout} selected={selected} />
    </svg>
  );
}

/** The crossing nearest to a press. */
function nearestCrossing(event: MouseEvent<HTMLElement>, layout: IncipitLayout): number | null {
  const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
  let nearest: { crossing: number; distance: number } | null = null;
  for (const note of layout.notes) {
    const distance = Math.abs(note.x - x);
    if (!nearest || distance < nearest.distance) nearest = { crossing: note.crossing, distance };
  }
  return nearest?.crossing ?? null;
}

/** The picture under its text alternative; with `onSelect` one can walk its crossings. */
function Named({
  props,
  layout,
  children,
}: {
  props: IncipitProps;
  layout: IncipitLayout | null;
  children: ReactNode;
}) {
  const { selected = null, onSelect, decorative, crossings, coordinate } = props;
  if (decorative) return <View aria-hidden>{children}</View>;
  const words = incipitWords(props);
  if (!onSelect) {
    return (
      <View role="img" aria-label={words}>
        {children}
      </View>
    );
  }
  return (
    <CrossingWalk
      name={words}
      count={crossings.length}
      selected={selected}
      onSelect={onSelect}
      valueText={(index) => `crossing ${index + 1}, ${coordinate} = ${crossings[index] ?? ''}`}
      onPress={(event) => {
        const crossing = layout ? nearestCrossing(event, layout) : null;
        if (crossing !== null) onSelect(crossing);
      }}
    >
      {children}
    </CrossingWalk>
  );
}

/** An orbit as one line of engraved music, in which every mark is data. */
export function Incipit(props: IncipitProps) {
  const [measured, setMeasured] = useState<number | null>(null);
  const width = props.width ?? measured;
  const layout = width === null ? null : incipitLayout(props, width);
  const drawing = layout ? <Drawing props={props} layout={layout} /> : null;
  return (
    <Named props={props} layout={layout}>
      {props.width === undefined ? (
        <View
          style={{ width: '100%', minHeight: incipitHeight(props) }}
          onLayout={(event) => setMeasured(event.nativeEvent.layout.width)}
        >
          {drawing}
        </View>
      ) : (
        drawing
      )}
    </Named>
  );
}
