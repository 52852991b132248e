import { countWord } from '@/features/notation/count-word';
import { dotPath } from '@/features/notation/dot-path';
import { SvgLabel } from '@/features/notation/svg-label';
import { colour, series } from '@/features/ui';
import { CrossingMarks } from './crossing-marks';
import { extremeText } from './extreme-text';
import { type PlotFrame, plotFrame } from './plot-frame';
import { PlotPicture } from './plot-picture';
import { polylinePath } from './polyline-path';
import { RangeFrame } from './range-frame';
import { rangeOf } from './range-of';

export type PlanePoint = readonly [number, number];

export interface SectionPlotProps {
  /** Names of the two coordinates on the section. */
  names: readonly [string, string];
  /** This orbit's crossings, in order of time. */
  crossings: readonly PlanePoint[];
  /** Crossings of other entries. */
  known?: readonly PlanePoint[];
  /** Lines on which the flow is tangent to the section. */
  tangency?: readonly (readonly PlanePoint[])[];
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
  return <path d={dots} fill={colour.staff} />;
}

function Tangency({ frame, lines }: { frame: PlotFrame; lines: readonly (readonly PlanePoint[])[] }) {
  const path = lines.map((line) => polylinePath(line.map(([x, y]) => [frame.x(x), frame.y(y)] as const))).join('');
  const first = lines[0]?.[0];
  return (
    <g>
      <path d={path} fill="none" stroke={series[2]} strokeWidth={1.4} strokeDasharray="6 4" />
      {first ? (
        <SvgLabel
          x={frame.x(first[0]) - 6}
          y={frame.y(first[1]) + 16}
          face="reading"
          anchor="end"
          paint={series[2]}
          halo={colour.page}
        >
          tangency
        </SvgLabel>
      ) : null}
    </g>
  );
}

/** A frame with room around the crossings; its axes stand outside that room. */
function roomyFrame(width: number, height: number, xRange: [number, number], yRange: [number, number]): PlotFrame {
  const room = 1 + 2 * AROUND;
  const [w, h] = [(width - 84) / room, (height - 70) / room];
  const margin = { left: 64 + w * AROUND, right: 20 + w * AROUND, top: 26 + h * AROUND, bottom: 44 + h * AROUND };
  const frame = plotFrame({ width, height, xRange, yRange, equal: true, margin });
  const axisShift = { x: (frame.right - frame.left) * AROUND, y: (frame.bottom - frame.top) * AROUND };
  return { ...frame, axisShift };
}

/** The crossings of an orbit on its section, among known ones. */
export function SectionPlot(props: SectionPlotProps) {
  const { names, crossings, known = [], tangency = [], width, height, selected = null, onSelect } = props;
  const xRange = rangeOf(crossings.map(([x]) => x));
  const yRange = rangeOf(crossings.map(([, y]) => y));
  const frame = roomyFrame(width, height, xRange, yRange);
  const [wideX, wideY] = [widened(xRange), widened(yRange)];
  const isNear = ([x, y]: PlanePoint) => x >= wideX[0] && x <= wideX[1] && y >= wideY[0] && y <= wideY[1];
  const marks = crossings.map(([x, y]) => ({ x: frame.x(x), y: frame.y(y) }));
  const words =
    `${countWord(crossings.length)} crossings on the section: ${names[0]} from ${extremeText(xRange[0])} to ${extremeText(xRange[1])}, ` +
    `${names[1]} from ${extremeText(yRange[0])} to ${extremeText(yRange[1])}`;
  return (
    <PlotPicture
      {...{ width, height, words, marks, selected }}
      {...(onSelect && { onSelect })}
      valueText={(i) =>
        `crossing ${i + 1}, ${names[0]} = ${extremeText(crossings[i]?.[0] ?? 0)}, ${names[1]} = ${extremeText(crossings[i]?.[1] ?? 0)}`
      }
    >
      <RangeFrame frame={frame} xName={names[0]} yName={names[1]} />
      {known.length > 0 ? <Neighbours frame={frame} known={known.filter(isNear)} /> : null}
      <Tangency frame={frame} lines={tangency.map((line) => line.filter(isNear)).filter((line) => line.length > 1)} />
      <CrossingMarks {...{ marks, selected, width, height }} />
    </PlotPicture>
  );
}
