import { useState } from 'react';
import { View } from 'react-native';
import { colour, Text } from '@/features/ui';
import { toDouble } from './to-double';

export interface PeriodRangeProps {
  /** Orbits per slice of the range, slices of equal width. */
  counts: readonly number[];
  /** Shortest and longest period under the other filters. */
  shortest: string;
  longest: string;
  /** The chosen range as typed; empty where it is open. */
  from: string;
  to: string;
  onChange: (from: string, to: string) => void;
}

const HEIGHT = 44;
const BASE = 40;
const STEPS = 400;
/** Significant digits of an end that was dragged. */
const DIGITS = 4;

const rounded = (value: number): string => String(parseFloat(value.toPrecision(DIGITS)));

function strokes(counts: readonly number[], width: number, isIn: (slice: number) => boolean): string {
  const most = Math.log1p(Math.max(1, ...counts));
  return counts
    .map((count, i) => {
      if (count === 0 || !isIn(i)) return '';
      const x = ((i + 0.5) / counts.length) * width;
      return `M${x.toFixed(1)} ${BASE}V${(BASE - 4 - (BASE - 8) * (Math.log1p(count) / most)).toFixed(1)}`;
    })
    .join('');
}

interface SliderProps {
  name: string;
  value: number;
  min: number;
  max: number;
  onValue: (value: number) => void;
}

function Slider({ name, value, min, max, onValue }: SliderProps) {
  return (
    <input
      type="range"
      className="r-range"
      aria-label={name}
      aria-valuetext={rounded(value)}
      min={min}
      max={max}
      step={(max - min) / STEPS}
      value={value}
      onChange={(event) => onValue(toDouble(event.target.value))}
    />
  );
}

function Picture({
  counts,
  width,
  isIn,
  ends,
}: {
  counts: readonly number[];
  width: number;
  isIn: (slice: number) => boolean;
  ends: [number, number];
}) {
  const x = (part: number) => (part * width).toFixed(1);
  return (
    <svg width={width} height={HEIGHT} aria-hidden style={{ overflow: 'visible' }}>
      <path d={strokes(counts, width, (i) => !isIn(i))} stroke={colour.staff} strokeWidth={1.4} />
      <path d={strokes(counts, width, isIn)} stroke={colour.verdigris} strokeWidth={2.6} />
      <path d={`M0.5 ${BASE + 4}V${BASE}H${width - 0.5}V${BASE + 4}`} stroke={colour.staff} fill="none" />
      <path d={`M${x(ends[0])} ${BASE}H${x(ends[1])}`} stroke={colour.verdigris} strokeWidth={2.6} />
    </svg>
  );
}

/** The catalogue's periods as strokes, and the chosen range; both ends can be dragged or moved by key. */
export function PeriodRange({ counts, shortest, longest, from, to, onChange }: PeriodRangeProps) {
  const [width, setWidth] = useState(0);
  const min = toDouble(shortest);
  const max = toDouble(longest);
  const within = (text: string, open: number) => {
    const value = text.trim() === '' ? open : toDouble(text);
    return Number.isFinite(value) ? Math.min(max, Math.max(min, value)) : open;
  };
  const low = within(from, min);
  const high = within(to, max);
  const part = (value: number) => (max > min ? (value - min) / (max - min) : 0);
  const chosen = from.trim() !== '' || to.trim() !== '';
  const isIn = (i: number) => chosen && (i + 1) / counts.length >= part(low) && i / counts.length <= part(high);
  return (
    <View onLayout={(event) => setWidth(event.nativeEvent.layout.width)}>
      <div style={{ position: 'relative', height: HEIGHT }}>
        {width > 0 ? <Picture counts={counts} width={width} isIn={isIn} ends={[part(low), part(high)]} /> : null}
        <Slider
          name="Shortest period"
          value={low}
          min={min}
          max={max}
          onValue={(v) => onChange(rounded(Math.min(v, high)), to)}
        />
        <Slider
          name="Longest period"
          value={high}
          min={min}
          max={max}
          onValue={(v) => onChange(from, rounded(Math.max(v, low)))}
        />
      </div>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between' }} aria-hidden>
        <Text mono size={13} tone="muted">
          {rounded(min)}
        </Text>
        <Text mono size={13} tone="muted">
          {rounded(max)}
        </Text>
      </View>
    </View>
  );
}
