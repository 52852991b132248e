import type { KnownByReturns, System } from '@/schemas/generated/contract';

/** The most returns up to which every orbit that the itineraries allow is known; null when that is not so or not known. */
export function completeUpTo({ knownByReturns }: Pick<System, 'knownByReturns'>): number | null {
  const reached = knownByReturns.map(reachOf).filter((returns) => returns !== null);
  return reached.length === 0 ? null : Math.max(...reached);
}

function reachOf({ rows }: KnownByReturns): number | null {
  let reached: number | null = null;
  const rising = [...rows].sort((a, b) => a.returns - b.returns);
  for (const { returns, known, allowed } of rising) {
    if (allowed === null || known < allowed) break;
    reached = returns;
  }
  return reached;
}
