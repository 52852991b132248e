import { decimalParts } from './decimal-parts';
import { superscript } from './superscript';

/** One run of digits that are all verified or all not. */
export interface DigitRun {
  text: string;
  verified: boolean;
  /** A gap stands before it; it begins a group of three. */
  gap: boolean;
}

export interface DigitGroups {
  runs: DigitRun[];
  /** Significant digits in the value, and how many of them are shown. */
  digits: number;
  shown: number;
  /** `·10⁻⁴³`, or nothing. */
  power: string;
}

interface Placed {
  character: string;
  gap: boolean;
  /** 1 for the first significant digit; signs, points and leading zeros take the place of what follows. */
  rank: number;
}

/** Groups of three count from the point, both ways; whole parts of four digits stay together. */
const GROUP = 3;
const UNGROUPED = 4;

function place(sign: string, whole: string, fraction: string): Placed[] {
  const placed: Placed[] = sign ? [{ character: '−', gap: false, rank: 1 }] : [];
  let rank = 0;
  const push = (character: string, gap: boolean) => {
    if (rank > 0 || character !== '0') rank += 1;
    placed.push({ character, gap, rank: Math.max(1, rank) });
  };
  Array.from(whole).forEach((digit, i) =>
    push(digit, i > 0 && whole.length > UNGROUPED && (whole.length - i) % GROUP === 0),
  );
  if (fraction) placed.push({ character: '.', gap: false, rank: Math.max(1, rank) });
  Array.from(fraction).forEach((digit, i) => push(digit, i > 0 && i % GROUP === 0));
  return placed;
}

/** A decimal string in runs for drawing: groups of three, verified digits apart from the rest, at most `max` significant digits. */
export function digitGroups(value: string, verified = 0, max = Infinity): DigitGroups {
  const parts = decimalParts(value);
  if (!parts) return { runs: [{ text: value, verified: false, gap: false }], digits: 0, shown: 0, power: '' };
  const placed = place(parts.sign, parts.whole, parts.fraction);
  const digits = placed.at(-1)?.rank ?? 0;
  const runs: DigitRun[] = [];
  for (const { character, gap, rank } of placed) {
    if (rank > max) break;
    const last = runs.at(-1);
    const isVerified = rank <= verified;
    if (last && !gap && last.verified === isVerified) last.text += character;
    else runs.push({ text: character, verified: isVerified, gap });
  }
  const power = parts.exponent === 0 ? '' : `·10${superscript(parts.exponent)}`;
  return { runs, digits, shown: Math.min(digits, max), power };
}
