import { invalidBody } from '@/server/errors';
import { childPointer, pointerLabel } from '@/server/http/json-pointer';

/** Deepest nesting of a body; a submission needs four. */
const MAX_BODY_DEPTH = 32;

interface Visit {
  value: unknown;
  pointer: string;
  depth: number;
}

/**
 * Refuse what no body may hold, whatever its schema: more than `MAX_BODY_DEPTH` levels, a member called `__proto__`,
 * numbers that overflowed while they were read, and characters the database cannot keep.
 *
 * Walks with a stack of its own, so that no nesting can exhaust the call stack.
 *
 * @throws {Problem} `invalid-body` with the pointer of the first offence.
 */
export function guardJson(body: unknown): void {
  const waiting: Visit[] = [{ value: body, pointer: '', depth: 0 }];
  for (let visit = waiting.pop(); visit; visit = waiting.pop()) {
    const { value, pointer, depth } = visit;
    if (typeof value === 'string') refuseOddText(value, pointer);
    else if (typeof value === 'number') refuseOverflow(value, pointer);
    else if (typeof value === 'object' && value !== null) {
      if (depth >= MAX_BODY_DEPTH) refuse(pointer, `is nested deeper than ${MAX_BODY_DEPTH} levels`);
      for (const [member, child] of Object.entries(value)) {
        const childAt = childPointer(pointer, member);
        if (member === '__proto__') refuse(childAt, 'is a name that no member may have');
        refuseOddText(member, childAt);
        waiting.push({ value: child, pointer: childAt, depth: depth + 1 });
      }
    }
  }
}

function refuseOddText(text: string, pointer: string): void {
  if (text.includes('\u0000')) refuse(pointer, 'holds the character U+0000, which cannot be kept');
  if (/\p{Surrogate}/u.test(text)) refuse(pointer, 'holds half of a surrogate pair, which is not a character');
}

function refuseOverflow(value: number, pointer: string): void {
  if (!Number.isFinite(value)) refuse(pointer, 'is too large for a JSON number; numbers stay below 1e100');
}

function refuse(pointer: string, reason: string): never {
  throw invalidBody([{ pointer: pointer.slice(0, 300), message: `${pointerLabel(pointer).slice(0, 300)} ${reason}.` }]);
}
