/**
 * The smallest of a text's rotations in the order of its characters: the name of an itinerary up to cyclic shift.
 *
 * Source: the minimal rotation by comparing two candidates, common practice; linear time.
 */
export function smallestRotation(letters: string): string {
  const n = letters.length;
  let first = 0;
  let second = 1;
  let same = 0;
  while (first < n && second < n && same < n) {
    const a = letters[(first + same) % n]!;
    const b = letters[(second + same) % n]!;
    if (a === b) {
      same += 1;
      continue;
    }
    if (a > b) first += same + 1;
    else second += same + 1;
    if (first === second) second += 1;
    same = 0;
  }
  const start = Math.min(first, second);
  return letters.slice(start) + letters.slice(0, start);
}
