import { Path } from 'react-native-svg';
import { countWord } from '@/features/notation/count-word';
import { series } from '@/features/ui';
import { mathName } from '@/features/notation/math-name';
import type { Trace } from '@/schemas/generated/contract';
import { CrossingMarks } from './crossing-marks';
import { extremeText } from './extreme-text';
import { plotFrame } from './plot-frame';
import { PlotPicture } from './plot-picture';
import { polylinePath } from './polyline-path';
import { RangeFrame } from './range-frame';
import { rangeOf } from './range-of';
import { traceCrossings } from './trace-crossings';

export interface TimePlotProps {
  trace: Trace;
  /** Index of the coordinate. */
  coordinate: number;
  section?: { variable: string; level: number } | null;
  width: number;
  height: number;
  selected?: number | null;
  onSelect?: (crossing: number) => void;
}

/** One coordinate against time over a period, with the crossings. */
export function TimePlot({
  trace,
  coordinate,
  section = null,
  width,
  height,
  selected = null,
  onSelect,
}: TimePlotProps) {
  const crossings = traceCrossings(trace);
  const name = mathName(trace.variables[coordinate] ?? '');
  const values = trace.points.map((point) => point[coordinate] ?? 0);
  const frame = plotFrame({ width, height, xRange: rangeOf(trace.times), yRange: rangeOf(values) });
  const marks = crossings.map(({ time, point }) => ({ x: frame.x(time), y: frame.y(point[coordinate] ?? 0) }));
  const level = section && section.variable === trace.variables[coordinate] ? section.level : null;
  const line = values.map((value, i) => [frame.x(trace.times[i] ?? 0), frame.y(value)] as const);
  const words =
    `${name} against time over one period of ${extremeText(frame.xRange[1])}, from ${extremeText(frame.yRange[0])} ` +
    `to ${extremeText(frame.yRange[1])}; ${countWord(marks.length)} crossings`;
  return (
    <PlotPicture
      {...{ width, height, words, marks, selected }}
      {...(onSelect && { onSelect })}
      valueText={(i) => `crossing ${i + 1}, t = ${extremeText(crossings[i]?.time ?? 0)}`}
    >
      <RangeFrame frame={frame} xName="t" yName={name} yTicks={level === null ? [0] : [level]} />
      {level === null ? null : (
        <Path
          d={`M${frame.left} ${frame.y(level)}H${frame.right}`}
          stroke={series[2]}
          strokeWidth={1.4}
          strokeDasharray="6 4"
        />
      )}
      <Path d={polylinePath(line)} fill="none" stroke={series[0]} strokeWidth={1.8} strokeLinejoin="round" />
      <CrossingMarks {...{ marks, selected, width, height }} />
    </PlotPicture>
  );
}
