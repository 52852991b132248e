import { useFewOrbits } from '@/features/api/orbits';
import { draftOfBody } from '@/features/checking/orbit-draft';
import type { CheckedOrbit, Submission, System } from '@/schemas/generated/contract';

/** Entries shown beside the submission; one more is asked for, since the submission may be an entry by now. */
const SHOWN = 3;

/** The entries whose crossings come nearest to a submitted orbit, with their distances and incipits. */
export function useNearest(submission: Submission, orbit: CheckedOrbit | null, system: System | undefined) {
  const chosen = Object.entries(draftOfBody(submission.body).parameters).filter(([, value]) => value !== '');
  const filter = {
    ...(system && { system: system.slug }),
    ...(chosen.length > 0 && { parameters: Object.fromEntries(chosen) }),
    near: orbit?.point.join(',') ?? '',
    sort: 'distance',
  };
  const near = useFewOrbits(filter, SHOWN + 1, system !== undefined && orbit !== null);
  const items = near.data?.items.filter(({ accession }) => accession !== submission.accession).slice(0, SHOWN) ?? [];
  return { near, items };
}
