import { G, Path } from 'react-native-svg';
import { countWord } from '@/features/notation/count-word';
import { colour, series } from '@/features/ui';
import { mathName } from '@/features/notation/math-name';
import type { Trace } from '@/schemas/generated/contract';
import { CrossingMarks } from './crossing-marks';
import { extremeText } from './extreme-text';
import { type PlotFrame, plotFrame } from './plot-frame';
import { PlotLabel } from './plot-label';
import { PlotPicture } from './plot-picture';
import { polylinePath } from './polyline-path';
import { RangeFrame } from './range-frame';
import { rangeOf } from './range-of';
import { traceCrossings } from './trace-crossings';
import { seenFrom, type Turn, unturned } from './turn';

export interface OrbitPlotProps {
  trace: Trace;
  /** Indices of the coordinates drawn across and upward. */
  axes: readonly [number, number];
  /** The coordinate that a turn brings in. */
  depth?: number | null;
  turn?: Turn;
  /** The section, where it is a level of one coordinate. */
  section?: { variable: string; level: number } | null;
  width: number;
  height: number;
  selected?: number | null;
  onSelect?: (crossing: number) => void;
}

const LINE = 1.8;

function project({
  axes,
  depth = null,
  turn = unturned,
}: OrbitPlotProps): (point: readonly number[]) => [number, number] {
  const at = (point: readonly number[], index: number) => point[index] ?? 0;
  if (depth === null || (turn.yaw === 0 && turn.pitch === 0)) return (p) => [at(p, axes[0]), at(p, axes[1])];
  return (p) => seenFrom(turn, [at(p, axes[0]), at(p, axes[1]), at(p, depth)]);
}

/** An arrowhead on the line, a little after its first point: which way it runs. */
function arrowPath(points: readonly (readonly [number, number])[]): string {
  const at = Math.max(1, Math.round(points.length * 0.03));
  const [from, to] = [points[at - 1], points[at]];
  if (!from || !to) return '';
  const angle = Math.atan2(to[1] - from[1], to[0] - from[0]);
  const corner = (turnBy: number, length: number) =>
    `${(to[0] + length * Math.cos(angle + turnBy)).toFixed(1)} ${(to[1] + length * Math.sin(angle + turnBy)).toFixed(1)}`;
  return `M${corner(0, 5)}L${corner(2.5, 6)}L${corner(-2.5, 6)}Z`;
}

function SectionLine({
  frame,
  section,
  drawn,
}: {
  frame: PlotFrame;
  section: OrbitPlotProps['section'];
  /** Names of the two coordinates, as the system has them. */
  drawn: readonly (string | undefined)[];
}) {
  if (!section) return null;
  const { left, right, top, bottom, x, y } = frame;
  const { variable, level } = section;
  const stroke = { stroke: series[2], strokeWidth: 1.4, strokeDasharray: '6 4' };
  if (variable === drawn[1]) {
    return (
      <G>
        <Path d={`M${left} ${y(level)}H${right}`} {...stroke} />
        <PlotLabel x={left - 22} y={y(level) + 21} face="reading" size={13} anchor="end" paint={series[2]}>
          section
        </PlotLabel>
      </G>
    );
  }
  if (variable !== drawn[0]) return null;
  return (
    <G>
      <Path d={`M${x(level)} ${top}V${bottom}`} {...stroke} />
      <PlotLabel x={x(level)} y={top - 8} face="reading" size={13} anchor="middle" paint={series[2]} halo={colour.page}>
        section
      </PlotLabel>
    </G>
  );
}

/** Names of the three axes at a corner, once the picture is turned and the frame means nothing any more. */
function Triad({ turn, names, height }: { turn: Turn; names: readonly [string, string, string]; height: number }) {
  const ends = (
    [
      [1, 0, 0],
      [0, 1, 0],
      [0, 0, 1],
    ] as const
  ).map((unit) => seenFrom(turn, unit));
  const [x, y, length] = [44, height - 40, 26];
  return (
    <G>
      <Path
        d={ends.map((e) => `M${x} ${y}L${x + e[0] * length} ${y - e[1] * length}`).join('')}
        stroke={colour.staff}
      />
      {ends.map((e, i) => (
        <PlotLabel
          key={i}
          x={x + e[0] * (length + 10)}
          y={y - e[1] * (length + 10) + 5}
          size={16}
          face="readingItalic"
          paint={colour.ink}
          anchor="middle"
        >
          {names[i]}
        </PlotLabel>
      ))}
    </G>
  );
}

/** An orbit projected on two coordinates, or turned to show a third; notes are its crossings. */
export function OrbitPlot(props: OrbitPlotProps) {
  const {
    trace,
    axes,
    depth = null,
    turn = unturned,
    section = null,
    width,
    height,
    selected = null,
    onSelect,
  } = props;
  const crossings = traceCrossings(trace);
  const isTurned = depth !== null && (turn.yaw !== 0 || turn.pitch !== 0);
  const projected = trace.points.map(project(props));
  const frame = plotFrame({
    width,
    height,
    equal: true,
    xRange: rangeOf(projected.map(([x]) => x)),
    yRange: rangeOf(projected.map(([, y]) => y)),
  });
  const points = projected.map(([x, y]) => [frame.x(x), frame.y(y)] as const);
  const marks = crossings.map(({ point }) => project(props)(point)).map(([x, y]) => ({ x: frame.x(x), y: frame.y(y) }));
  const name = (index: number) => mathName(trace.variables[index] ?? '');
  const names = [name(axes[0]), name(axes[1]), depth === null ? '' : name(depth)] as const;
  const drawn = [trace.variables[axes[0]], trace.variables[axes[1]]] as const;
  const levels = section ? [0, section.level] : [0];
  const words =
    `One period projected on ${names[0]} and ${names[1]}: ${names[0]} from ${extremeText(frame.xRange[0])} to ${extremeText(frame.xRange[1])}, ` +
    `${names[1]} from ${extremeText(frame.yRange[0])} to ${extremeText(frame.yRange[1])}; ${countWord(marks.length)} crossings`;
  return (
    <PlotPicture
      {...{ width, height, words, marks, selected }}
      {...(onSelect && { onSelect })}
      valueText={(i) => `crossing ${i + 1}, t = ${extremeText(crossings[i]?.time ?? 0)}`}
    >
      {isTurned ? (
        <Triad turn={turn} names={names} height={height} />
      ) : (
        <RangeFrame
          frame={frame}
          xName={names[0]}
          yName={names[1]}
          xTicks={section?.variable === drawn[0] ? levels : [0]}
          yTicks={section && section.variable === drawn[1] ? [section.level] : [0]}
        />
      )}
      <Path d={polylinePath(points)} fill="none" stroke={series[0]} strokeWidth={LINE} strokeLinejoin="round" />
      <Path d={arrowPath(points)} fill={series[0]} />
      {isTurned ? null : <SectionLine frame={frame} section={section} drawn={drawn} />}
      <CrossingMarks {...{ marks, selected, width, height }} />
    </PlotPicture>
  );
}
