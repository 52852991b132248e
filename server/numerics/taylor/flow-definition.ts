import type { Expression } from '@/server/numerics/expression/expression';

/** A system with one set of parameters and one section. */
export interface FlowDefinition {
  variables: readonly { name: string; modulus: number | null }[];
  parameters: readonly { name: string; value: number }[];
  /** In order: each may use the ones before it. */
  definitions: readonly { name: string; expression: Expression }[];
  /** In the order of the variables. */
  equations: readonly Expression[];
  /** u: the section is where it vanishes. */
  section: Expression;
  /** Evaluated at points only: letters, invariants. */
  outputs: readonly Expression[];
}
