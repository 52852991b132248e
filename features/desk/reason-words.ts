import type { ReasonCode, Submission } from '@/schemas/generated/contract';

/** The seven reasons, in words. */
export const reasonWords: Readonly<Record<ReasonCode, string>> = {
  'does-not-close': 'does not close',
  'not-transverse': 'not transverse',
  'already-known': 'already known',
  'not-prime': 'not prime',
  'wrong-system-or-parameters': 'wrong system or parameters',
  'out-of-scope': 'out of scope',
  'description-lacking': 'description lacking',
};

const decided = { accept: 'Accepted', return: 'Returned', decline: 'Declined' } as const;

/** A decision in words: who, what, why. */
export function decisionWords({ decision, reason, by }: NonNullable<Submission['decision']>): string {
  return `${decided[decision]} by ${by}${reason ? `: ${reasonWords[reason]}` : ''}`;
}
