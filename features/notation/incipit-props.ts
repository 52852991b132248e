import type { Multiplier } from './format-multiplier';
import type { OrbitState } from './orbit-state';

/** A number for drawing: a double, or the decimal string that the API sends. */
export type Drawable = number | string;

/** What an incipit draws. */
export interface IncipitMusic {
  /** The drawn coordinate at each crossing, the start first. */
  crossings: readonly Drawable[];
  /** Time from each crossing to the next; the last leads back to the first. */
  returnTimes: readonly Drawable[];
  /** T; the sum of the return times unless given. Needed while checking, when not all of them are known. */
  period?: Drawable;
  /** The coordinate along the flow: [time, value], time from 0 to T. */
  flow?: readonly (readonly number[])[] | null;
  /** The five staff levels, highest first. */
  levels: readonly number[];
  /** `null`: not known yet, or meaningless. */
  multipliers?: readonly Multiplier[] | null;
  state: OrbitState;
  /** One character per crossing, in the same order. */
  letters?: string | null;
  /** Name of the drawn coordinate, for the text alternative. */
  coordinate: string;
  /** Modulus of an angle: the hairline breaks where it jumps. */
  modulus?: number | null;
  /** Crossing with which the drawing begins. */
  start?: number;
  /** Indices, as drawn, whose letters differ from the staff it is compared with. */
  differs?: readonly number[];
  /** Checking: the time reached. */
  upTo?: number;
  /** Where an orbit ended that does not close. */
  end?: { time: Drawable; value: Drawable } | null;
}

export interface IncipitProps extends IncipitMusic {
  /** px; as wide as its container unless given. */
  width?: number;
  /** Distance of two lines, px: 5 in the queue, 6 to 9 on phones, 7 in rows, 8 on cards, 15 across an entry. */
  space: number;
  /** Draw the letters under the staff. */
  showLetters?: boolean;
  levelLabels?: boolean;
  /** Selected crossing, counted as given (not as rotated). */
  selected?: number | null;
  onSelect?: (crossing: number) => void;
  /** Draw the repeat sign in, once. */
  animate?: boolean;
  /** Hide the text alternative: the numbers stand beside it. */
  decorative?: boolean;
}
