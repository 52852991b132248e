import { type Finding } from '@/schemas/generated/contract';
import { type Claim, type TypedValue } from '@/server/checks/claim';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { type Survey } from '@/server/checks/study';
import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';
import { withoutTrivial } from '@/server/checks/survey-orbit';

/** Multipliers are compared to this share of their size where more digits are stated than a check vouches for. */
const MULTIPLIER_ACCURACY = 1e-8;

/** Compare the number of returns and the return times that were stated with those found. */
export function returnClaims({ returns, returnTimes, points, tolerance }: Claim, survey: Survey): Finding[] {
  const found = survey.crossings.length;
  const findings: Finding[] = [];
  const stated = returns ?? returnTimes?.length ?? (points === null ? found : points.length + 1);
  if (stated !== found) {
    findings.push(
      finding('returns-differ', {
        message: `The orbit returns ${found} times in one period; ${stated} are stated.`,
        value: found,
        limit: stated,
      }),
    );
  }
  if (returnTimes === null) return findings;
  if (returnTimes.length !== found) {
    if (returns === null) return findings;
    const message = `The orbit has ${found} return times in one period; ${returnTimes.length} are stated.`;
    return [...findings, finding('return-times-differ', { message, value: found, limit: returnTimes.length })];
  }
  const slack = tolerance * survey.period;
  const beyond = survey.crossings.map(({ returnTime }, i) => excess(returnTimes[i]!, returnTime, slack));
  const worst = beyond.indexOf(Math.max(...beyond));
  if (beyond[worst]! <= 0) return findings;
  const { returnTime } = survey.crossings[worst]!;
  const message = `Return time ${worst + 1} is ${String(returnTime)}; ${returnTimes[worst]!.text} is stated.`;
  return [
    ...findings,
    finding('return-times-differ', { message, value: returnTime, limit: returnTimes[worst]!.value }),
  ];
}

/**
 * By how much a stated number is further from the one found than its last place and the slack allow. Printed figures are
 * rounded (half a unit off, either way) or cut off (up to a unit too small).
 */
function excess({ value, halfUnit }: TypedValue, found: number, slack: number): number {
  const cutOff = Math.abs(found) >= Math.abs(value) && found * value >= 0;
  return Math.abs(found - value) - (cutOff ? 2 : 1) * halfUnit - slack;
}

/** Compare the stated multipliers, in any order, with those found; a stated trivial 1 is allowed where all are given. */
export function multiplierClaims({ multipliers }: Claim, survey: Survey): Finding[] {
  if (multipliers === null) return [];
  const isWhole = multipliers.length === survey.multipliers.length;
  const left = [...(isWhole ? survey.multipliers : withoutTrivial(survey.multipliers))];
  for (const { re, im } of multipliers) {
    const nearest = nearestTo(left, re.value, im.value);
    const found = left[nearest];
    if (found === undefined) {
      return [differs(`There are ${survey.multipliers.length - 1} multipliers; ${multipliers.length} are stated.`)];
    }
    const value = complexOf(found);
    const slack = MULTIPLIER_ACCURACY * Math.max(1, Math.hypot(value.re, value.im));
    if (excess(re, value.re, slack) > 0 || excess(im, value.im, slack) > 0) {
      const stated = im.value === 0 ? re.text : `${re.text} + ${im.text} i`;
      const like = complexOf(likest(left, Math.hypot(re.value, im.value)));
      return [differs(`No multiplier is ${stated}; the one of that size is ${inWords(like)}.`, like.re, re.value)];
    }
    left.splice(nearest, 1);
  }
  return [];
}

function differs(message: string, value: number | null = null, limit: number | null = null): Finding {
  return finding('multipliers-differ', { message, value, limit });
}

function complexOf({ re, im, logModulus }: Multiplier): { re: number; im: number } {
  const modulus = Math.exp(Math.min(logModulus, 700));
  return { re: re * modulus, im: im * modulus };
}

function inWords({ re, im }: { re: number; im: number }): string {
  return im === 0 ? figure(re) : `${figure(re)} + ${figure(im)} i`;
}

/** The multiplier whose modulus is nearest to the one given. */
function likest(multipliers: readonly Multiplier[], modulus: number): Multiplier {
  const distance = ({ logModulus }: Multiplier): number => Math.abs(Math.exp(Math.min(logModulus, 700)) - modulus);
  return multipliers.reduce((best, multiplier) => (distance(multiplier) < distance(best) ? multiplier : best));
}

function nearestTo(multipliers: readonly Multiplier[], re: number, im: number): number {
  let nearest = -1;
  let least = Infinity;
  multipliers.forEach((multiplier, i) => {
    const value = complexOf(multiplier);
    const distance = Math.hypot(value.re - re, value.im - im);
    if (distance < least) {
      least = distance;
      nearest = i;
    }
  });
  return nearest;
}
