/** Exact text of a number: a decimal, or a fraction of integers. */
type Exact = string;

export interface ComplexNumber {
  re: Exact;
  im: Exact;
}

interface ReferenceCrossing {
  t: Exact;
  sign: -1 | 0 | 1;
  normalised_speed: Exact;
  point: Record<string, Exact>;
}

/** One case of cases.json, as README.md beside it describes it. */
export interface ReferenceCase {
  id: string;
  title: string;
  family: string;
  tags: string[];
  kind: 'orbit' | 'reject' | 'flag';
  system: { variables: string[]; parameters: Record<string, Exact>; equations: Record<string, string> };
  section: { expression: string; direction: 1 | -1 };
  point: Record<string, Exact>;
  period: Exact;
  prime_period?: boolean;
  crossings?: { directed: number; both_directions: number };
  return_times?: Exact[];
  crossing_list?: ReferenceCrossing[];
  multipliers?: ComplexNumber[];
  unit_multipliers?: number;
  largest_nontrivial_modulus?: Exact | null;
  stability?: string;
  divergence_integral?: Exact;
  invariants?: Record<string, { expression: string; value: Exact }>;
  symbols?: string;
  symbols_computed?: string;
  same_orbit_as?: string[];
  mirror_image_of?: string[];
  expect: { verdict: 'accept' | 'reject' | 'flag'; reason: string; detail?: string };
  based_on?: string;
  duplicate_of?: string;
  claims?: { crossings_directed?: number; return_times?: Exact[]; multipliers?: Exact[] };
}
