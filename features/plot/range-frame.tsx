import { G, Path } from 'react-native-svg';
import { colour } from '@/features/ui';
import { extremeText } from './extreme-text';
import type { PlotFrame } from './plot-frame';
import { PlotLabel } from './plot-label';

export interface RangeFrameProps {
  frame: PlotFrame;
  xName: string;
  yName: string;
  /** Values at which something happens: the section's level, zero. */
  xTicks?: readonly number[];
  yTicks?: readonly number[];
}

/** px between the data and their axis. */
export const AXIS_OFFSET = 12;
const TICK = 6;
/** Ticks closer to an end than this are left out. */
const CLOSE = 16;
const CLOSE_X = 34;

function inside(
  ticks: readonly number[],
  place: (value: number) => number,
  ends: readonly [number, number],
  close: number,
): number[] {
  const [a, b] = [Math.min(...ends), Math.max(...ends)];
  return ticks.filter((tick) => place(tick) > a + close && place(tick) < b - close);
}

function YAxis({ frame, yName, yTicks = [] }: RangeFrameProps) {
  const { left, top, bottom, y, yRange, axisShift } = frame;
  const axis = left - AXIS_OFFSET - (axisShift?.x ?? 0);
  const ticks = inside(yTicks, y, [top, bottom], CLOSE);
  const marks = ticks.map((tick) => `M${axis - TICK} ${y(tick)}H${axis}`).join('');
  return (
    <G>
      <Path d={`M${axis - TICK} ${top}H${axis}V${bottom}H${axis - TICK}${marks}`} stroke={colour.staff} fill="none" />
      {[yRange[1], ...ticks, yRange[0]].map((value, i) => (
        <PlotLabel key={i} x={axis - TICK - 4} y={y(value) + 4.5} anchor="end">
          {extremeText(value)}
        </PlotLabel>
      ))}
      <PlotLabel x={axis} y={top - 10} size={16} face="readingItalic" paint={colour.ink} anchor="middle">
        {yName}
      </PlotLabel>
    </G>
  );
}

function XAxis({ frame, xName, xTicks = [] }: RangeFrameProps) {
  const { left, right, bottom, x, xRange, axisShift } = frame;
  const axis = bottom + AXIS_OFFSET + (axisShift?.y ?? 0);
  const ticks = inside(xTicks, x, [left, right], CLOSE_X);
  const marks = ticks.map((tick) => `M${x(tick)} ${axis}V${axis + TICK}`).join('');
  const narrow = right - left < 90;
  return (
    <G>
      <Path d={`M${left} ${axis + TICK}V${axis}H${right}V${axis + TICK}${marks}`} stroke={colour.staff} fill="none" />
      <PlotLabel x={left} y={axis + TICK + 14} anchor={narrow ? 'end' : 'middle'}>
        {extremeText(xRange[0])}
      </PlotLabel>
      {ticks.map((value) => (
        <PlotLabel key={value} x={x(value)} y={axis + TICK + 14} anchor="middle">
          {extremeText(value)}
        </PlotLabel>
      ))}
      <PlotLabel x={right} y={axis + TICK + 14} anchor={narrow ? 'start' : 'middle'}>
        {extremeText(xRange[1])}
      </PlotLabel>
      <PlotLabel x={right + 18} y={axis + 5} size={16} face="readingItalic" paint={colour.ink} anchor="middle">
        {xName}
      </PlotLabel>
    </G>
  );
}

/** Axes that span the data only: their end labels are the extremes. */
export function RangeFrame(props: RangeFrameProps) {
  return (
    <G>
      <YAxis {...props} />
      <XAxis {...props} />
    </G>
  );
}
