import { useFewOrbits } from '@/features/api/orbits';
import type { Entry } from '@/schemas/generated/contract';

/** Entries asked for on either side; the entry itself is among them. */
const SIDE = 4;

export interface Neighbours {
  /** Shorter periods, the nearest first. */
  below: Entry[];
  /** Longer periods, the nearest first. */
  above: Entry[];
  incipits: Record<string, number[][]>;
  isPending: boolean;
  isError: boolean;
}

/** Entries of the same system and parameters on either side of an entry's period. */
export function useNeighbours({ accession, system, parameters, period }: Entry): Neighbours {
  const same = { system: system.slug, parameters };
  const below = useFewOrbits({ ...same, periodMax: period, sort: '-period' }, SIDE);
  const above = useFewOrbits({ ...same, periodMin: period, sort: 'period' }, SIDE);
  const others = (items: Entry[] = []) => items.filter((item) => item.accession !== accession);
  const shorter = others(below.data?.items);
  const seen = new Set(shorter.map((item) => item.accession));
  return {
    below: shorter,
    above: others(above.data?.items).filter((item) => !seen.has(item.accession)),
    incipits: { ...below.data?.incipits, ...above.data?.incipits },
    isPending: below.isPending || above.isPending,
    isError: below.isError || above.isError,
  };
}
