import type { CheckRequest } from '@/schemas/generated/contract';
import { type FieldError, invalidContent } from '@/server/errors';
import { readClaim } from '@/server/checks/read-claim';
import type { CheckedSystem } from '@/server/formulas/checked-system';

/** Digits that are computed in double precision. */
export const MOST_DIGITS = 15;

/**
 * Insist that a body of the right form states something that can be checked.
 *
 * @throws {Problem} `invalid-content` with a pointer and a sentence for everything that is wrong with it.
 */
export function validateClaim(system: CheckedSystem, body: Omit<CheckRequest, 'system'>): void {
  const read = readClaim(system, body);
  const errors: FieldError[] = read.ok ? [] : [...read.errors];
  if (body.digits !== undefined && body.digits > MOST_DIGITS) {
    const message = `At most ${MOST_DIGITS} digits can be confirmed at present; ${body.digits} are asked for.`;
    errors.push({ pointer: '/digits', message });
  }
  if (errors.length > 0) throw invalidContent(errors);
}
