import { useMemo } from 'react';
import { G, Path } from 'react-native-svg';
import { countWord } from '@/features/notation/count-word';
import { dotPath } from '@/features/notation/dot-path';
import { colour, series } from '@/features/ui';
import { CrossingMarks } from './crossing-marks';
import { extremeText } from './extreme-text';
import { levelLines } from './level-lines';
import { type OtherOrbit, OtherOrbits } from './other-orbits';
import { placeNames } from './place-names';
import type { PlanePoint } from './plane-point';
import { type PlotFrame, plotFrame } from './plot-frame';
import { PlotLabel } from './plot-label';
import { PlotPicture } from './plot-picture';
import { polylinePath } from './polyline-path';
import { AXIS_OFFSET, RangeFrame } from './range-frame';
import { rangeOf } from './range-of';

export interface SectionPlotProps {
  /** Names of the two coordinates on the section. */
  names: readonly [string, string];
  /** This orbit's crossings, in order of time. */
  crossings: readonly PlanePoint[];
  /** Crossings of other entries. */
  known?: readonly PlanePoint[];
  /** Crossings of up to three other orbits, named. */
  others?: readonly OtherOrbit[];
  /** grad u · f at a point of the section: the flow is tangent where it is zero. */
  sign?: ((x: number, y: number) => number) | null;
  width: number;
  height: number;
  selected?: number | null;
  onSelect?: (crossing: number) => void;
}

/** Margin around the crossings in which neighbours and tangency are still drawn, in extents. */
const AROUND = 0.12;

const widened = ([low, high]: [number, number]): [number, number] => {
  const more = (high - low) * AROUND;
  return [low - more, high + more];
};

function Neighbours({ frame, known }: { frame: PlotFrame; known: readonly PlanePoint[] }) {
  const dots = known.map(([x, y]) => dotPath(frame.x(x), frame.y(y), 0.9)).join('');
  return <Path d={dots} fill={colour.staff} />;
}

interface TangencyProps {
  lines: readonly (readonly { x: number; y: number }[])[];
  place: { x: number; y: number } | null;
}

function Tangency({ lines, place }: TangencyProps) {
  return (
    <G>
      <Path
        d={lines.map((line) => polylinePath(line.map(({ x, y }) => [x, y] as const))).join('')}
        fill="none"
        stroke={series[2]}
        strokeWidth={1.4}
        strokeDasharray="6 4"
      />
      {place ? (
        <PlotLabel {...place} face="reading" anchor="middle" paint={series[2]} halo={colour.page}>
          tangency
        </PlotLabel>
      ) : null}
    </G>
  );
}

/** A frame with room around the crossings; its axes stand outside that room. */
function roomyFrame(width: number, height: number, xRange: [number, number], yRange: [number, number]) {
  const room = 1 + 2 * AROUND;
  const [w, h] = [(width - 84) / room, (height - 70) / room];
  const margin = { left: 64 + w * AROUND, right: 20 + w * AROUND, top: 26 + h * AROUND, bottom: 44 + h * AROUND };
  const frame = plotFrame({ width, height, xRange, yRange, equal: true, margin });
  const axisShift = { x: (frame.right - frame.left) * AROUND, y: (frame.bottom - frame.top) * AROUND };
  return { ...frame, axisShift };
}

/** Lines of tangency in the part of the section that is drawn. */
function useTangency(sign: SectionPlotProps['sign'], x: readonly [number, number], y: readonly [number, number]) {
  const [x0, x1, y0, y1] = [...x, ...y];
  return useMemo(() => (sign ? levelLines(sign, { x: [x0, x1], y: [y0, y1] }) : []), [sign, x0, x1, y0, y1]);
}

/** The crossings of an orbit on its section, among those of others. */
export function SectionPlot(props: SectionPlotProps) {
  const { names, crossings, known = [], others = [], sign, width, height, selected = null, onSelect } = props;
  const all = [...crossings, ...others.flatMap(({ points }) => points)];
  const xRange = rangeOf(all.map(([x]) => x));
  const yRange = rangeOf(all.map(([, y]) => y));
  const frame = roomyFrame(width, height, xRange, yRange);
  const [wideX, wideY] = [widened(xRange), widened(yRange)];
  const isNear = ([x, y]: PlanePoint) => x >= wideX[0] && x <= wideX[1] && y >= wideY[0] && y <= wideY[1];
  const marksOf = (points: readonly PlanePoint[]) => points.map(([x, y]) => ({ x: frame.x(x), y: frame.y(y) }));
  const marks = marksOf(crossings);
  const lines = useTangency(sign, wideX, wideY).map(marksOf);
  const named = others.map(({ name, points }) => ({ name, marks: marksOf(points) }));
  const [tangencyPlace = null, ...places] = placeNames(marks, [{ name: 'tangency', marks: lines.flat() }, ...named], {
    width,
    height,
    axes: { x: frame.left - AXIS_OFFSET - frame.axisShift.x, y: frame.bottom + AXIS_OFFSET + frame.axisShift.y },
  });
  return (
    <PlotPicture
      {...{ width, height, words: wordsOf(names, crossings, others), marks, selected }}
      {...(onSelect && { onSelect })}
      valueText={(i) =>
        `crossing ${i + 1}, ${names[0]} = ${extremeText(crossings[i]?.[0] ?? 0)}, ${names[1]} = ${extremeText(crossings[i]?.[1] ?? 0)}`
      }
    >
      <RangeFrame frame={frame} xName={names[0]} yName={names[1]} />
      {known.length > 0 ? <Neighbours frame={frame} known={known.filter(isNear)} /> : null}
      <Tangency lines={lines} place={tangencyPlace} />
      <OtherOrbits others={named.map((orbit, i) => ({ ...orbit, place: places[i] ?? null }))} />
      <CrossingMarks {...{ marks, selected, width, height }} />
    </PlotPicture>
  );
}

/** The picture in words. */
function wordsOf(
  names: readonly [string, string],
  crossings: readonly PlanePoint[],
  others: readonly OtherOrbit[],
): string {
  const range = (index: 0 | 1) => {
    const [low, high] = rangeOf(crossings.map((point) => point[index]));
    return `${names[index]} from ${extremeText(low)} to ${extremeText(high)}`;
  };
  const beside = others.length > 0 ? `; beside those of ${others.map(({ name }) => name).join(', ')}` : '';
  return `${countWord(crossings.length)} crossings on the section: ${range(0)}, ${range(1)}${beside}`;
}
