import { type MouseEvent, useMemo } from 'react';
import { View } from 'react-native';
import { G, Path, Svg } from 'react-native-svg';
import { dotPath } from '@/features/notation/dot-path';
import { formatCount } from '@/features/notation/format-count';
import { colour, series, web } from '@/features/ui';
import { extremeText } from './extreme-text';
import { LabelRoom } from './label-room';
import { levelLines, type PlaneBox } from './level-lines';
import { type PlotFrame, plotFrame } from './plot-frame';
import { PlotLabel } from './plot-label';
import { polylinePath } from './polyline-path';
import { pressedCrossing } from './pressed-crossing';
import { RangeFrame } from './range-frame';
import { rangeOf } from './range-of';
import type { PlanePoint } from './plane-point';

/** A letter of the itineraries, at its region. */
export interface RegionLetter {
  letter: string;
  x: number;
  y: number;
}

export interface SectionSheetProps {
  names: readonly [string, string];
  /** grad u · f at a point of the section: where it is positive a crossing counts. `null` where it is not known. */
  sign: ((x: number, y: number) => number) | null;
  /** Lines of tangency; found from `sign` unless given. */
  tangency?: readonly (readonly PlanePoint[])[];
  /** All known crossings. */
  crossings: readonly PlanePoint[];
  letters?: readonly RegionLetter[];
  width: number;
  height: number;
  onPress?: (crossing: number) => void;
}

/** Margin around the crossings, in extents. */
const AROUND = 0.12;
/** Marks across the longer side. */
const MARKS = 15;
const MOST_MARK = 4.5;
const LEAST_MARK = 2;
/** No mark this close to a dot or a letter, px. */
const CLEAR = 8;
/** Crossings drawn; of more an even sample. */
const MOST_CROSSINGS = 20_000;
/** Half of the width of "tangency", px; how far from its line its middle stands. */
const TANGENCY_HALF = 28;
const ASIDE = 38;
/** Dots that labels keep off: of more an even sample shows where they are. */
const MOST_KEPT_OFF = 1000;

const widened = ([low, high]: [number, number]): [number, number] => {
  const more = (high - low) * AROUND;
  return [low - more, high + more];
};

/** Occupied places in cells of `CLEAR` px, so that asking for one costs nothing. */
function occupied(
  frame: PlotFrame,
  points: readonly PlanePoint[],
  letters: readonly RegionLetter[],
  label: PxPoint | null,
): (x: number, y: number) => boolean {
  const cells = new Set<string>();
  const mark = (px: number, py: number, reach: number) => {
    const [i, j] = [Math.floor(px / CLEAR), Math.floor(py / CLEAR)];
    for (let a = -reach; a <= reach; a += 1) for (let b = -reach; b <= reach; b += 1) cells.add(`${i + a},${j + b}`);
  };
  for (const [x, y] of points) mark(frame.x(x), frame.y(y), 1);
  for (const { x, y } of letters) mark(frame.x(x), frame.y(y), 2);
  if (label) for (let dx = -TANGENCY_HALF; dx <= TANGENCY_HALF; dx += CLEAR) mark(label.x + dx, label.y - 4, 1);
  return (px, py) => cells.has(`${Math.floor(px / CLEAR)},${Math.floor(py / CLEAR)}`);
}

/** A place in the picture, px. */
interface PxPoint {
  x: number;
  y: number;
}

interface Field {
  plus: string;
  dash: string;
}

function fieldMarks(
  frame: PlotFrame,
  box: PlaneBox,
  sign: (x: number, y: number) => number,
  isTaken: (x: number, y: number) => boolean,
): Field {
  const longer = Math.max(frame.x(box.x[1]) - frame.x(box.x[0]), frame.y(box.y[0]) - frame.y(box.y[1]));
  const step = longer / MARKS;
  const sites: { px: number; py: number; value: number }[] = [];
  for (let px = frame.x(box.x[0]) + step / 2; px < frame.x(box.x[1]); px += step) {
    for (let py = frame.y(box.y[1]) + step / 2; py < frame.y(box.y[0]); py += step) {
      const [x, y] = [
        invert(px, frame.left, frame.right, frame.xRange),
        invert(py, frame.bottom, frame.top, frame.yRange),
      ];
      const value = sign(x, y);
      if (Number.isFinite(value) && !isTaken(px, py)) sites.push({ px, py, value });
    }
  }
  const most = Math.max(...sites.map(({ value }) => Math.abs(value)), Number.MIN_VALUE);
  const field: Field = { plus: '', dash: '' };
  for (const { px, py, value } of sites) {
    const half = LEAST_MARK + (MOST_MARK - LEAST_MARK) * Math.sqrt(Math.abs(value) / most);
    const dash = `M${(px - half).toFixed(1)} ${py.toFixed(1)}h${(2 * half).toFixed(1)}`;
    if (value > 0) field.plus += `${dash}M${px.toFixed(1)} ${(py - half).toFixed(1)}v${(2 * half).toFixed(1)}`;
    else field.dash += dash;
  }
  return field;
}

const invert = (place: number, from: number, to: number, range: readonly [number, number]): number =>
  range[0] + ((place - from) / (to - from)) * (range[1] - range[0]);

/** Room for the field around the crossings, beside the axes' own. */
const marginsFor = (width: number, height: number) => ({
  left: 70 + width * 0.07,
  right: 16 + width * 0.09,
  top: 26 + height * 0.07,
  bottom: 44 + height * 0.09,
});

function useSheet(props: SectionSheetProps) {
  const { sign, tangency, crossings, letters = [], width, height } = props;
  return useMemo(() => {
    const step = Math.max(1, Math.ceil(crossings.length / MOST_CROSSINGS));
    const points = step === 1 ? crossings : crossings.filter((_, i) => i % step === 0);
    const xRange = rangeOf(points.map(([x]) => x));
    const yRange = rangeOf(points.map(([, y]) => y));
    const margin = marginsFor(width, height);
    const frame = plotFrame({ width, height, xRange, yRange, equal: true, margin });
    const box: PlaneBox = { x: widened(xRange), y: widened(yRange) };
    const lines = tangency ?? (sign ? levelLines(sign, box) : []);
    const label = tangencyPlace(frame, lines, points, letters);
    const field = sign ? fieldMarks(frame, box, sign, occupied(frame, points, letters, label)) : null;
    const dots = points.map(([x, y]) => dotPath(frame.x(x), frame.y(y), 1)).join('');
    return { frame, field, lines, label, dots };
  }, [sign, tangency, crossings, letters, width, height]);
}

/** Where the word "tangency" stands: beside its longest line, near the middle, off dots and letters. */
function tangencyPlace(
  frame: PlotFrame,
  lines: readonly (readonly PlanePoint[])[],
  points: readonly PlanePoint[],
  letters: readonly RegionLetter[],
): PxPoint | null {
  const room = new LabelRoom(frame);
  const step = Math.max(1, Math.ceil(points.length / MOST_KEPT_OFF));
  points.forEach(([x, y], i) => {
    if (i % step === 0) room.take({ x: frame.x(x), y: frame.y(y) }, CLEAR, CLEAR);
  });
  for (const { x, y } of letters) room.take({ x: frame.x(x), y: frame.y(y) }, 2 * CLEAR, 2 * CLEAR);
  const longest = [...lines].sort((a, b) => b.length - a.length)[0] ?? [];
  const middle = longest.length / 2;
  const outward = longest.map((point, i) => ({ point, away: Math.abs(i - middle) })).sort((a, b) => a.away - b.away);
  return room.place(
    'tangency',
    outward.flatMap(({ point: [x, y] }) =>
      [-1, 1].flatMap((side) => [-10, 10].map((dy) => ({ x: frame.x(x) + side * ASIDE, y: frame.y(y) + dy }))),
    ),
  );
}

function Tangency({
  frame,
  lines,
  place,
}: {
  frame: PlotFrame;
  lines: readonly (readonly PlanePoint[])[];
  place: PxPoint | null;
}) {
  return (
    <G>
      <Path
        d={lines.map((line) => polylinePath(line.map(([x, y]) => [frame.x(x), frame.y(y)] as const))).join('')}
        fill="none"
        stroke={series[2]}
        strokeWidth={1.6}
        strokeDasharray="7 5"
      />
      {place ? (
        <PlotLabel {...place} anchor="middle" face="reading" size={14} paint={series[2]} halo={colour.page}>
          tangency
        </PlotLabel>
      ) : null}
    </G>
  );
}

/** The section as a map: plus where the flow rises through it, dash where it falls, the tangency, all known crossings. */
export function SectionSheet(props: SectionSheetProps) {
  const { names, crossings, letters = [], width, height, onPress } = props;
  const { frame, field, lines, label, dots } = useSheet(props);
  const words =
    `Section sheet: ${formatCount(crossings.length)} known crossings, ${names[0]} from ${extremeText(frame.xRange[0])} to ` +
    `${extremeText(frame.xRange[1])}, ${names[1]} from ${extremeText(frame.yRange[0])} to ${extremeText(frame.yRange[1])}`;
  const onClick = (event: MouseEvent<HTMLElement>) => {
    const marks = crossings.map(([x, y]) => ({ x: frame.x(x), y: frame.y(y) }));
    const pressed = pressedCrossing(event, marks, CLEAR);
    if (pressed !== null) onPress?.(pressed);
  };
  return (
    <View role="img" aria-label={words} {...web({ onClick })}>
      <Svg width={width} height={height} aria-hidden>
        {field ? <Path d={field.dash} stroke={colour.staff} strokeWidth={1} /> : null}
        {field ? <Path d={field.plus} stroke={series[0]} strokeWidth={1.2} /> : null}
        <Tangency frame={frame} lines={lines} place={label} />
        <Path d={dots} fill={colour.ink} />
        <RangeFrame frame={sheetFrame(frame)} xName={names[0]} yName={names[1]} />
        {letters.map(({ letter, x, y }) => (
          <PlotLabel
            key={letter}
            x={frame.x(x)}
            y={frame.y(y)}
            size={16}
            anchor="middle"
            paint={colour.ink}
            halo={colour.page}
          >
            {letter}
          </PlotLabel>
        ))}
      </Svg>
    </View>
  );
}

/** The axes stand outside the margin in which the field is drawn. */
function sheetFrame(frame: PlotFrame): PlotFrame {
  const [dx, dy] = [(frame.right - frame.left) * AROUND, (frame.bottom - frame.top) * AROUND];
  return { ...frame, axisShift: { x: dx, y: dy } };
}
