import type { Entry, Stability } from '@/schemas/generated/contract';

export const stabilities: readonly Stability[] = ['stable', 'saddle', 'unstable', 'neutral', 'undecided'];

export const evidenceLevels: readonly Entry['evidence']['level'][] = ['re-integrated', 'refined', 'proved'];

/** Every order of results; each has its index. A minus turns it round. */
export const sortNames = [
  'period',
  '-period',
  'returns',
  '-returns',
  'multiplier',
  '-multiplier',
  'newest',
  'oldest',
  'accession',
  'distance',
] as const;

export type SortName = (typeof sortNames)[number];
