import type { Multiplier } from './format-multiplier';
import type { Drawable, IncipitMusic } from './incipit-props';
import type { OrbitState } from './orbit-state';

/** What an entry or a checked orbit gives: its crossings with 0 < t ≤ T, the last being the start. */
export interface CrossedOrbit {
  crossings: readonly { time: string; point: readonly string[]; returnTime?: string }[];
  returnTimes?: readonly string[];
  period: string;
  multipliers: readonly Multiplier[];
  itinerary: string | null;
}

/** What a system's section says of its incipits. */
export interface IncipitChoice {
  coordinate: string;
  levels: readonly number[];
}

export interface OrbitMusicOptions {
  /** Names of the system's variables, in order. */
  variables: readonly string[];
  incipit: IncipitChoice;
  state: OrbitState;
  flow?: readonly (readonly number[])[] | null;
  modulus?: number | null;
}

/** What an incipit draws of an orbit: the start first, then its crossings in order of time. */
export function orbitMusic(orbit: CrossedOrbit, options: OrbitMusicOptions): IncipitMusic {
  const { variables, incipit, state, flow = null, modulus = null } = options;
  const index = Math.max(0, variables.indexOf(incipit.coordinate));
  const heights: Drawable[] = orbit.crossings.map(({ point }) => point[index] ?? '0');
  const last = heights.at(-1);
  return {
    crossings: last === undefined ? [] : [last, ...heights.slice(0, -1)],
    returnTimes: orbit.returnTimes ?? orbit.crossings.map(({ returnTime }) => returnTime ?? '0'),
    period: orbit.period,
    flow,
    levels: incipit.levels,
    multipliers: orbit.multipliers,
    state,
    coordinate: incipit.coordinate,
    modulus,
  };
}
