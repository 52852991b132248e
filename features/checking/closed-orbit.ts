import type { CheckedOrbit, CheckReport } from '@/schemas/generated/contract';

/** The orbit of a report that closes; null where the one found is only a neighbour of what was typed. */
export const closedOrbit = ({ verdict, orbit }: CheckReport): CheckedOrbit | null =>
  verdict === 'closes' || verdict === 'closes-after-correction' ? orbit : null;
