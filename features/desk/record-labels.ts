import type { Decision } from '@/schemas/generated/contract';

/** What the button that records a decision says. */
export const recordLabels: Readonly<Record<Decision['decision'], string>> = {
  accept: 'Accept as the next entry',
  return: 'Return to the contributor',
  decline: 'Decline',
};
