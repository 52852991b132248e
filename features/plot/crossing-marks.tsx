import { G, Path } from 'react-native-svg';
import { colour } from '@/features/ui';
import { noteheadPath } from '@/features/notation/notehead-path';
import { placeLabels } from './place-labels';
import { PlotLabel } from './plot-label';

export interface CrossingMarksProps {
  /** px, in order of time, the start first. */
  marks: readonly { x: number; y: number }[];
  selected?: number | null;
  width: number;
  height: number;
  /** Draw numbers where there is room. */
  numbered?: boolean;
}

const NOTE = 10.4;
/** Beyond this many noteheads they are drawn smaller. */
const MANY = 40;
const SMALL_NOTE = 7;
const RING = 20;
/** Numbers this close to the selected crossing give way to its own, px. */
const NEAR = 24;

/** Crossings as noteheads, numbered in order of time; the selected one in a ring. */
export function CrossingMarks({ marks, selected = null, width, height, numbered = true }: CrossingMarksProps) {
  const size = marks.length > MANY ? SMALL_NOTE : NOTE;
  const chosen = selected === null ? undefined : marks[selected];
  const labels = numbered ? placeLabels(marks, { width, height }) : [];
  const isNearChosen = (mark: { x: number; y: number } | undefined) =>
    chosen !== undefined && mark !== undefined && Math.hypot(mark.x - chosen.x, mark.y - chosen.y) < NEAR;
  const shown = labels.filter(({ index }) => !isNearChosen(marks[index]));
  return (
    <G>
      <Path
        d={marks.map(({ x, y }) => noteheadPath(x, y, size)).join('')}
        fill={colour.ink}
        stroke={colour.page}
        strokeWidth={1}
      />
      {shown.map(({ index, text, x, y }) => (
        <PlotLabel key={index} x={x} y={y} anchor="middle" paint={colour.ink} halo={colour.page}>
          {text}
        </PlotLabel>
      ))}
      {chosen && selected !== null ? (
        <G>
          <Path d={noteheadPath(chosen.x, chosen.y, RING)} fill="none" stroke={colour.indigo} strokeWidth={2} />
          <PlotLabel
            x={chosen.x + 15}
            y={chosen.y - 12}
            anchor="middle"
            paint={colour.indigo}
            face="numberSemibold"
            halo={colour.page}
          >
            {selected + 1}
          </PlotLabel>
        </G>
      ) : null}
    </G>
  );
}
