import { type Survey } from '@/server/checks/study';
import { type Multiplier } from '@/server/numerics/periodic/floquet-multipliers';

/** What was measured on a closed orbit, as it is for the same orbit run through several times. */
export function repeatSurvey(survey: Survey, turns: number): Survey {
  const { period, crossings, transversalities, itinerary, winding, liouville, pairing } = survey;
  const rounds = Array.from({ length: turns }, (_, round) => round);
  return {
    ...survey,
    period: turns * period,
    crossings: rounds.flatMap((round) =>
      crossings.map((one) => ({
        ...one,
        time: one.time === period ? (round + 1) * period : one.time + round * period,
      })),
    ),
    transversalities: rounds.flatMap(() => transversalities),
    multipliers: survey.multipliers.map((multiplier) => powerOf(multiplier, turns)),
    itinerary: itinerary === null ? null : itinerary.repeat(turns),
    liouville: liouville === null ? null : turns * liouville,
    pairing: pairing === null ? null : turns * pairing,
    winding: winding === null ? null : winding.map((whole) => (whole === null ? null : turns * whole)),
  };
}

/** λ^turns; a real one stays real. */
function powerOf({ re, im, logModulus }: Multiplier, turns: number): Multiplier {
  if (im === 0) return { re: turns % 2 === 0 ? 1 : re, im, logModulus: turns * logModulus };
  const angle = turns * Math.atan2(im, re);
  return { re: Math.cos(angle), im: Math.sin(angle), logModulus: turns * logModulus };
}
