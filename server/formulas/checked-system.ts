import type { SystemDocument } from '@/schemas/generated/contract';
import type { TypedNumberRead } from '@/server/formulas/typed-number';
import type { Expression } from '@/server/numerics/expression/expression';

/** Something wrong in a document or a body; `position` counts a formula's characters from 1. */
export interface ContentError {
  /** JSON Pointer. */
  pointer: string;
  message: string;
  position: number | null;
}

export interface CheckedSection {
  /** Null for a section that the system does not name. */
  name: string | null;
  /** Canonical text of u. */
  formula: string;
  expression: Expression;
  /** A letter holds at a crossing where its expression is positive; empty where the section has no alphabet. */
  letters: { letter: string; expression: Expression }[];
}

/** A system document whose formulas are parsed and whose names are known. */
export interface CheckedSystem {
  document: SystemDocument;
  variables: { name: string; modulus: number | null }[];
  parameters: { name: string; read: TypedNumberRead }[];
  definitions: { name: string; expression: Expression }[];
  /** In the order of the variables. */
  equations: Expression[];
  invariants: { name: string; expression: Expression }[];
  symmetries: { name: string; reversesTime: boolean; map: Expression[] }[];
  sections: (CheckedSection & { name: string })[];
  /** Names that a section's formula may use. */
  names: ReadonlySet<string>;
}
