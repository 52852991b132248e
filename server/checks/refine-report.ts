import { type CheckReport } from '@/schemas/generated/contract';
import { finding } from '@/server/checks/finding';
import { type ClaimBody } from '@/server/checks/read-claim';
import { DIGITS_OF_DOUBLES, refineOrbit } from '@/server/checks/refine-orbit';
import { type CheckedSystem } from '@/server/formulas/checked-system';

type Answer = Omit<CheckReport, 'engine'>;

/** What is asked for beyond doubles. */
interface WantedDigits {
  system: CheckedSystem;
  claim: ClaimBody & { digits?: number };
  shouldStop?: (() => boolean) | undefined;
}

/**
 * Give a closed orbit's point, period and return times as many digits as were asked for, where they are more than doubles
 * have; where they cannot be found the report says why and keeps those of doubles.
 */
export function refineReport(answer: Answer, { system, claim, shouldStop }: WantedDigits): Answer {
  const { digits = DIGITS_OF_DOUBLES } = claim;
  const { orbit, verdict } = answer;
  const closes = verdict === 'closes' || verdict === 'closes-after-correction';
  if (digits <= DIGITS_OF_DOUBLES || orbit === null || !closes) return answer;
  const found = refineOrbit({ system, claim, orbit, digits, shouldStop });
  if (!found.ok) {
    const refusal = finding('not-refined', { message: found.message, value: DIGITS_OF_DOUBLES, limit: digits });
    return { ...answer, findings: [...answer.findings, refusal] };
  }
  return {
    ...answer,
    orbit: {
      ...orbit,
      point: found.point,
      period: found.period,
      crossings: orbit.crossings.map((crossing, k) => ({
        ...crossing,
        ...found.crossings[k],
        returnTime: found.returnTimes[k]!,
      })),
    },
    digits: { typed: answer.digits?.typed ?? 0, confirmed: digits },
  };
}
