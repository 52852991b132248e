import { type Finding } from '@/schemas/generated/contract';
import { finding } from '@/server/checks/finding';
import { STIFF_STEPS } from '@/server/checks/limits';

/** Note a field that forces very short steps. */
export function stiffness(steps: number, returns: number): Finding[] {
  const each = Math.round(steps / Math.max(1, returns));
  if (each <= STIFF_STEPS) return [];
  const message = `The field is stiff: ${each} steps a return were needed.`;
  return [finding('stiff', { message, value: each, limit: STIFF_STEPS })];
}
