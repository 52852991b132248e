import type { CheckRequest } from '@/schemas/generated/contract';
import { readClaim } from '@/server/checks/read-claim';
import { invalidContent } from '@/server/errors';
import type { CheckedSystem } from '@/server/formulas/checked-system';

/**
 * Insist that a body of the right form states something that can be checked.
 *
 * @throws {Problem} `invalid-content` with a pointer and a sentence for everything that is wrong with it.
 */
export function validateClaim(system: CheckedSystem, body: Omit<CheckRequest, 'system'>): void {
  const read = readClaim(system, body);
  if (!read.ok) throw invalidContent(read.errors);
}
