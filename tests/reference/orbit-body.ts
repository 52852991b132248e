import type { SubmissionBody } from '@/schemas/generated/contract';
import type { SectionOrbit } from '@/tests/reference/load-orbits';

/** What the two tables have in common, as a submission states it. */
const claimsOf = ({ n, period, times, code }: SectionOrbit) => ({
  returns: Number(n),
  period,
  returnTimes: times,
  itinerary: code,
});

/** A line of the Lorenz table as a submission. */
export function lorenzBody(orbit: SectionOrbit): SubmissionBody {
  const [x, y] = orbit.points[0]!;
  return { system: 'lorenz', section: 'z-27', point: [x, y, '27'], ...claimsOf(orbit) };
}

/** A line of the Rössler table as a submission. */
export function rosslerBody(orbit: SectionOrbit): SubmissionBody {
  const [x, z] = orbit.points[0]!;
  return { system: 'rossler', section: 'y-down', point: [x, '0', z], ...claimsOf(orbit) };
}
