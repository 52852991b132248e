import { stateLook } from './orbit-state';
import type { Drawable, IncipitProps } from './incipit-props';
import { toDouble } from './to-double';

/** Crossings drawn at most; of a longer orbit the opening is shown. */
const MOST_DRAWN = 32;
/** In staff spaces. */
const CLEF_COLUMN = 7;
const MARGIN = 1.6;
const MOST_NOTE = 1.3;
const LEAST_NOTE = 0.58;
/** Notehead width in parts of the smallest gap. */
const NOTE_OF_GAP = 0.78;
/** px kept for the closing barline. */
const BAR_ROOM = 22;
const LETTER_ROOM = 20;
/** Width of an Iosevka character in font sizes. */
const CHARACTER = 0.5;

/** One crossing, placed. */
export interface PlacedNote {
  /** Index among the crossings as given. */
  crossing: number;
  x: number;
  y: number;
  letter: string | null;
  differs: boolean;
}

/** Everything of an incipit that has a place, in px. */
export interface IncipitLayout {
  width: number;
  height: number;
  /** Left and right end of the staff lines. */
  left: number;
  right: number;
  top: number;
  bottom: number;
  space: number;
  notes: PlacedNote[];
  /** Smallest distance of two notes. */
  gap: number;
  noteWidth: number;
  labelSize: number;
  /** "first 32 of 64", when the orbit is cut. */
  cut: { text: string; x: number } | null;
  xOf: (time: number) => number;
  yOf: (value: number) => number;
  period: number;
  /** Time at which the drawing begins. */
  origin: number;
}

const rotated = <T>(items: readonly T[], start: number): T[] => [...items.slice(start), ...items.slice(0, start)];

function runningSums(times: readonly number[]): number[] {
  let sum = 0;
  return times.map((time) => (sum += time));
}

function smallestGap(times: readonly number[]): number {
  return times.length === 0 ? Infinity : Math.min(...times);
}

const labelWidth = (levels: readonly number[], size: number): number =>
  Math.max(...levels.map((level) => String(level).length)) * size * CHARACTER + 8;

function timing(props: IncipitProps): { times: number[]; period: number; drawn: number; origin: number } {
  const { crossings, returnTimes, start = 0 } = props;
  const numbers = returnTimes.map(toDouble);
  const before = runningSums(numbers);
  const origin = start > 0 ? (before[start - 1] ?? 0) : 0;
  const period = props.period === undefined ? (before.at(-1) ?? 1) : toDouble(props.period);
  const rotatedTimes = rotated(numbers, start);
  return { times: [0, ...runningSums(rotatedTimes)], period, drawn: Math.min(crossings.length, MOST_DRAWN), origin };
}

function cutOf(props: IncipitProps, width: number): IncipitLayout['cut'] {
  const count = props.crossings.length;
  if (count <= MOST_DRAWN) return null;
  const text = `first ${MOST_DRAWN} of ${count}`;
  const { word } = stateLook[props.state];
  return { text, x: width - Math.max(text.length, word.length) * 13 * CHARACTER };
}

/** px; known before the width is. */
export const incipitHeight = ({ space, showLetters }: IncipitProps): number =>
  space * (4 + 2 * MARGIN) + (showLetters ? LETTER_ROOM : 0);

/** Place an incipit of a given width: the rules for incipits in one spot. */
export function incipitLayout(props: IncipitProps, width: number): IncipitLayout {
  const { space, levels, letters = null, levelLabels = false, differs = [], start = 0 } = props;
  const labelSize = space >= 12 ? 11 : 13;
  const left = levelLabels ? labelWidth(levels, labelSize) : 0;
  const top = space * MARGIN;
  const cut = cutOf(props, width);
  const { times, period, drawn, origin } = timing(props);
  const shownTime = cut ? (times[MOST_DRAWN] ?? period) : period;
  const first = left + space * (CLEF_COLUMN + MOST_NOTE / 2);
  const right = cut ? cut.x - 8 : width;
  const scale = (cut ? right - first : width - BAR_ROOM - first) / shownTime;
  const [highest = 1, lowest = -1] = [levels[0], levels[4]];
  const yOf = (value: number) => top + ((highest - value) / (highest - lowest)) * 4 * space;
  const xOf = (time: number) => first + time * scale;
  const gaps = times.slice(1, drawn + 1).map((time, i) => time - (times[i] ?? 0));
  const gap = smallestGap(gaps) * scale;
  const values: Drawable[] = rotated(props.crossings, start).slice(0, drawn);
  const shownLetters = letters ? rotated(Array.from(letters), start) : [];
  return {
    width,
    height: incipitHeight(props),
    left,
    right,
    top,
    bottom: top + 4 * space,
    space,
    notes: values.map((value, i) => ({
      crossing: (i + start) % props.crossings.length,
      x: xOf(times[i] ?? 0),
      y: yOf(toDouble(value)),
      letter: shownLetters[i] ?? null,
      differs: differs.includes(i),
    })),
    gap,
    noteWidth: Math.max(LEAST_NOTE * space, Math.min(MOST_NOTE * space, NOTE_OF_GAP * gap)),
    labelSize,
    cut,
    xOf,
    yOf,
    period,
    origin,
  };
}
