import { type Finding } from '@/schemas/generated/contract';
import { type FindingCode } from '@/server/checks/study';

const NOTES: readonly FindingCode[] = ['already-known', 'orbit-nearby', 'stiff'];
const WARNINGS: readonly FindingCode[] = [
  'near-tangent-crossing',
  'itinerary-differs',
  'invariant-drifts',
  'not-converged',
  'not-refined',
];

/** What a finding says. */
export interface FindingText {
  message: string;
  value?: number | null;
  limit?: number | null;
}

/** Make a finding; its severity belongs to its code. A value that is not finite is left out. */
export function finding(code: FindingCode, { message, value = null, limit = null }: FindingText): Finding {
  const finite = value !== null && Number.isFinite(value) ? value : null;
  const blocks = !NOTES.includes(code) && !WARNINGS.includes(code);
  const severity = blocks ? 'blocker' : NOTES.includes(code) ? 'note' : 'warning';
  return { code, severity, message, value: finite, limit };
}
