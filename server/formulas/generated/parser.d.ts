import type { ParsedNode } from '@/server/formulas/parsed-node';

/** What the generated parser throws; `location.start.offset` is where it stopped. */
export interface SyntaxError extends Error {
  location: { start: { offset: number } };
  expected: { type: string; description?: string; text?: string }[] | null;
}
export const SyntaxError: new (...parts: unknown[]) => SyntaxError;
export function parse(text: string): ParsedNode;
