/** How two itineraries agree best. */
export interface LetterComparison {
  /** Rotation of the second at which most letters agree. */
  start: number;
  /** Places, after rotation, where they differ. */
  differs: number[];
}

/** Rotate `other` to where it agrees with `letters` best; null when their lengths differ. */
export function compareLetters(letters: string, other: string): LetterComparison | null {
  const own = Array.from(letters);
  const theirs = Array.from(other);
  if (own.length !== theirs.length || own.length === 0) return null;
  let best: LetterComparison | null = null;
  for (let start = 0; start < own.length; start += 1) {
    const differs = own.flatMap((letter, i) => (letter === theirs[(i + start) % own.length] ? [] : [i]));
    if (!best || differs.length < best.differs.length) best = { start, differs };
  }
  return best;
}
