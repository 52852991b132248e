import type { ContentError } from '@/server/formulas/checked-system';
import { parseFormula } from '@/server/formulas/parse-formula';
import { readTypedNumber, type TypedNumberRead } from '@/server/formulas/typed-number';
import type { Expression } from '@/server/numerics/expression/expression';

/** Collects what is wrong, each with its JSON Pointer. */
export class ErrorList {
  readonly errors: ContentError[] = [];

  /** @param base pointer of the document in the body that holds it. */
  constructor(private readonly base: string) {}

  add(path: string, message: string, position: number | null = null): void {
    this.errors.push({ pointer: `${this.base}${path}`, message, position });
  }

  /** A formula's tree; null, and an error more, where it has none. */
  formula(path: string, text: string, known: ReadonlySet<string>): Expression | null {
    const parsed = parseFormula(text, known);
    if (parsed.ok) return parsed.expression;
    this.add(path, parsed.error.message, parsed.error.position);
    return null;
  }

  number(path: string, typed: string | number): TypedNumberRead | null {
    const read = readTypedNumber(typed);
    if (read.ok) return read.number;
    this.add(path, read.message);
    return null;
  }
}

/** A name as one segment of a JSON Pointer (RFC 6901, section 3). */
export const segment = (name: string): string => name.replace(/~/g, '~0').replace(/\//g, '~1');
