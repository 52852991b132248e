import { useState } from 'react';
import { View } from 'react-native';
import { colour, series } from '@/features/ui';
import { countWord } from './count-word';
import { formatLimit } from './format-limit';
import { formatSize } from './format-size';
import { noteheadPath } from './notehead-path';
import { SvgLabel } from './svg-label';

export interface CrossingDistanceProps {
  /** Time of each crossing, the first 0. */
  times: readonly number[];
  period: number;
  distances: readonly number[];
  /** Below this everywhere it is the same orbit. */
  same: number;
  /** Crossings whose letters differ. */
  differs?: readonly number[];
  /** px, of the score above it; as wide as its container unless given. */
  width?: number;
  /** As the score above it, so that the notes stand under its notes. */
  lineGap?: number;
}

const HEIGHT = 112;
const TOP = 16;
const BOTTOM = 88;
/** Smallest distance drawn when two crossings coincide. */
const LEAST = 1e-16;
const NOTE = 9;
/** Where the first note of an incipit stands, in staff spaces, and the room of its closing bar, px. */
const FIRST_NOTE = 7.65;
const BAR_ROOM = 22;
/** The bracket of the score above, px. */
const BRACKET = 12;

interface Scale {
  x: (time: number) => number;
  y: (log: number) => number;
  high: number;
  low: number;
  first: number;
  last: number;
}

function scaleOf(props: CrossingDistanceProps, width: number, logs: number[]): Scale {
  const { period, distances, same, lineGap = 8 } = props;
  const first = BRACKET + lineGap * FIRST_NOTE;
  const last = width - BAR_ROOM;
  const [high, low] = distances.length > 0 ? [Math.max(...logs), Math.min(...logs)] : [0, 0];
  const floor = Math.min(low, Math.log10(same));
  return {
    x: (time) => first + (time / period) * (last - first),
    y: (log) => TOP + ((high - log) / Math.max(high - floor, 1e-9)) * (BOTTOM - TOP),
    high,
    low,
    first,
    last,
  };
}

/** From here up a distance is written plainly beside its bracket. */
const PLAIN_FROM = 0.01;
const PLAIN_BELOW = 1000;

const distanceText = (distance: number): string =>
  distance >= PLAIN_FROM && distance < PLAIN_BELOW ? String(parseFloat(distance.toPrecision(3))) : formatSize(distance);

/** The largest and the smallest distance, at a bracket. */
function Ends({ scale: { y, high, low, first } }: { scale: Scale }) {
  const x = first - 26;
  const close = y(low) - y(high) < 14;
  return (
    <>
      <path d={`M${x + 4} ${y(high)}H${x}V${y(low)}H${x + 4}`} stroke={colour.staff} fill="none" />
      <SvgLabel x={x - 5} y={y(high) + (close ? -1 : 4)} anchor="end">
        {distanceText(10 ** high)}
      </SvgLabel>
      <SvgLabel x={x - 5} y={y(low) + (close ? 12 : 4)} anchor="end">
        {distanceText(10 ** low)}
      </SvgLabel>
    </>
  );
}

function wordsOf({ distances, same }: CrossingDistanceProps): string {
  const [low, high] = [Math.min(...distances), Math.max(...distances)];
  return (
    `${countWord(distances.length)} distances from ${formatSize(low)} to ${formatSize(high)}; ` +
    `the same orbit would lie below ${formatLimit(same)}`
  );
}

function Drawing({ props, width }: { props: CrossingDistanceProps; width: number }) {
  const { times, distances, same, differs = [] } = props;
  const logs = distances.map((distance) => Math.log10(Math.max(distance, LEAST)));
  const scale = scaleOf(props, width, logs);
  const { x, y, first, last } = scale;
  const heads = (differ: boolean) =>
    logs.map((log, i) => (differs.includes(i) === differ ? noteheadPath(x(times[i] ?? 0), y(log), NOTE) : '')).join('');
  const level = y(Math.log10(same));
  return (
    <svg width={width} height={HEIGHT} aria-hidden>
      <Ends scale={scale} />
      <path d={heads(false)} fill={colour.ink} />
      <path d={heads(true)} fill={colour.oxide} />
      <path d={`M${first} ${level}H${last}`} stroke={series[2]} strokeWidth={1.4} strokeDasharray="6 4" />
      <SvgLabel x={last} y={level - 7} face="reading" size={14} anchor="end" paint={series[2]}>
        {`the same orbit would lie below ${formatLimit(same)}`}
      </SvgLabel>
    </svg>
  );
}

/** How far apart two orbits are, crossing by crossing, on a log scale, with the level below which they are the same. */
export function CrossingDistance(props: CrossingDistanceProps) {
  const [measured, setMeasured] = useState<number | null>(null);
  const width = props.width ?? measured;
  return (
    <View
      role="img"
      aria-label={wordsOf(props)}
      style={{ minHeight: HEIGHT }}
      onLayout={(event) => setMeasured(event.nativeEvent.layout.width)}
    >
      {width ? <Drawing props={props} width={width} /> : null}
    </View>
  );
}
