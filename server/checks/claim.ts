import { type HeldQuantity } from '@/server/numerics/periodic/correct-orbit';
import { type Flow } from '@/server/numerics/taylor/flow';

/** A number as typed: its nearest double and half of its last typed place (0 where it is exact). */
export interface TypedValue {
  text: string;
  value: number;
  halfUnit: number;
}

/** A formula that is evaluated at points only: its place among the flow's outputs. */
export interface NamedOutput {
  name: string;
  output: number;
}

/** A symmetry of the system: its map, and whether it turns time round. */
export interface Symmetry {
  name: string;
  reversesTime: boolean;
  /** Places of the image's coordinates among the flow's outputs. */
  outputs: number[];
}

/** The quantity that a family's correction is to keep, at its value at the typed point. */
export interface Hold extends HeldQuantity {
  name: string;
}

/** An orbit as stated, its text read and its system compiled. */
export interface Claim {
  variables: string[];
  /** Modulus of each variable that is an angle, null for the others. */
  moduli: (number | null)[];
  flow: Flow;
  /** The same field with another section, by its formula u; null where the formula does not fit the system. */
  flowOn: (section: string) => Flow | null;
  /** u as a formula. */
  section: string;
  /** −u as a formula. */
  negatedSection: string;
  point: TypedValue[];
  /** Section points of the returns but the last; null where none are stated. */
  points: TypedValue[][] | null;
  hold: Hold | null;
  period: TypedValue;
  returns: number | null;
  returnTimes: TypedValue[] | null;
  itinerary: string | null;
  multipliers: { re: TypedValue; im: TypedValue }[] | null;
  tolerance: number;
  /** A letter holds where its output is positive. */
  letters: NamedOutput[];
  invariants: NamedOutput[];
  symmetries: Symmetry[];
}
