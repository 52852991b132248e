import { type Finding } from '@/schemas/generated/contract';
import { type Claim } from '@/server/checks/claim';
import { finding } from '@/server/checks/finding';

/**
 * Read the itinerary of an orbit: one letter per crossing, as its smallest rotation.
 *
 * @returns null where the section has no letters, or where no letter or two hold at a crossing.
 */
export function itineraryOf({ flow, letters }: Claim, points: readonly Float64Array[]): string | null {
  if (letters.length === 0) return null;
  let word = '';
  for (const point of points) {
    const values = flow.outputs(point);
    const holding = letters.filter(({ output }) => values[output]! > 0);
    if (holding.length !== 1) return null;
    word += holding[0]!.name;
  }
  return smallestRotation(word);
}

/** The rotation of a word that comes first in the order of its letters. */
export function smallestRotation(word: string): string {
  const m = word.length;
  let best = 0;
  let other = 1;
  let matched = 0;
  while (best < m && other < m && matched < m) {
    const a = word[(best + matched) % m]!;
    const b = word[(other + matched) % m]!;
    if (a === b) {
      matched += 1;
      continue;
    }
    if (a > b) best += matched + 1;
    else other += matched + 1;
    if (best === other) other += 1;
    matched = 0;
  }
  const from = Math.min(best, other);
  return word.slice(from) + word.slice(0, from);
}

/** Compare the claimed itinerary, up to rotation, with the one found. */
export function itineraryClaim(claimed: string | null, found: string | null): Finding[] {
  if (claimed === null || found === null || smallestRotation(claimed) === found) return [];
  return [
    finding('itinerary-differs', {
      message: `The itinerary is ${found}; ${smallestRotation(claimed)} is stated.`,
    }),
  ];
}
