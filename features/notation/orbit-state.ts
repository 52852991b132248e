import type { Tone } from '@/features/ui';
import type { CheckState, ReviewState, Verdict } from '@/schemas/generated/contract';

/** How far an orbit has come, as its closing barline shows it. */
export type OrbitState =
  | 'draft'
  | 'returned'
  | 'withdrawn'
  | 'queued'
  | 'checking'
  | 'closes'
  | 'closes-after-correction'
  | 'submitted'
  | 'in-review'
  | 'accepted'
  | 'does-not-close'
  | 'declined'
  | 'inconclusive'
  | 'failed';

/** Shape of the closing barline. */
type Barline = 'dashed' | 'thin' | 'two-thin' | 'thin-thick' | 'repeat' | 'broken' | 'none';

interface StateLook {
  word: string;
  tone: Tone;
  barline: Barline;
}

/** Word, colour and barline of every state. */
export const stateLook: Record<OrbitState, StateLook> = {
  draft: { word: 'draft', tone: 'muted', barline: 'dashed' },
  returned: { word: 'returned', tone: 'muted', barline: 'dashed' },
  withdrawn: { word: 'withdrawn', tone: 'muted', barline: 'dashed' },
  queued: { word: 'queued', tone: 'ochre', barline: 'thin' },
  checking: { word: 'checking', tone: 'ochre', barline: 'two-thin' },
  closes: { word: 'closes', tone: 'verdigris', barline: 'thin-thick' },
  'closes-after-correction': { word: 'closes after correction', tone: 'verdigris', barline: 'thin-thick' },
  submitted: { word: 'submitted', tone: 'verdigris', barline: 'thin-thick' },
  'in-review': { word: 'in review', tone: 'verdigris', barline: 'thin-thick' },
  accepted: { word: 'accepted', tone: 'verdigris', barline: 'repeat' },
  'does-not-close': { word: 'does not close', tone: 'oxide', barline: 'broken' },
  declined: { word: 'declined', tone: 'oxide', barline: 'broken' },
  inconclusive: { word: 'could not decide', tone: 'ochre', barline: 'none' },
  failed: { word: 'failed', tone: 'oxide', barline: 'none' },
};

function stateOfCheck(checkState: CheckState, verdict: Verdict | null): OrbitState | null {
  if (checkState === 'queued') return 'queued';
  if (checkState === 'running') return 'checking';
  if (checkState === 'failed') return 'failed';
  return verdict;
}

/** The one state to draw, from the two that a submission has. */
export function orbitState(reviewState: ReviewState, checkState: CheckState, verdict: Verdict | null): OrbitState {
  switch (reviewState) {
    case 'draft':
      return stateOfCheck(checkState, verdict) ?? 'draft';
    case 'submitted':
      return stateOfCheck(checkState, verdict) ?? 'submitted';
    case 'in-review':
    case 'accepted':
    case 'returned':
    case 'declined':
    case 'withdrawn':
      return reviewState;
  }
}
