import { invalidQuery } from '@/server/errors';

const MAX_POINTS = 5000;
const DEFAULT_POINTS = 600;

/**
 * How many points a drawing is to have.
 *
 * @throws {Problem} `invalid-query` at `#points`.
 */
export function readPoints(query: Readonly<Record<string, unknown>>): number {
  const { points: given, ...others } = query;
  const unknown = Object.keys(others)[0];
  if (unknown !== undefined) {
    throw invalidQuery([{ pointer: `#${unknown}`, message: `${unknown} is not a parameter of a trace.` }]);
  }
  if (given === undefined) return DEFAULT_POINTS;
  const points = typeof given === 'string' && /^[0-9]{1,4}$/.test(given) ? parseInt(given, 10) : 0;
  if (points < 2 || points > MAX_POINTS) {
    throw invalidQuery([{ pointer: '#points', message: `points is a whole number from 2 to ${MAX_POINTS}.` }]);
  }
  return points;
}
