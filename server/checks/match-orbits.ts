import { type Finding, type OrbitMatch } from '@/schemas/generated/contract';
import { type Claim, type Symmetry } from '@/server/checks/claim';
import { crossingsOfLegs, type Leg } from '@/server/checks/crossings-of-legs';
import { figure } from '@/server/checks/figure';
import { finding } from '@/server/checks/finding';
import { SAME_ORBIT, SAME_ORBIT_TOLERANCES } from '@/server/checks/limits';
import { type Survey } from '@/server/checks/study';
import { closestRotation, type Rotation } from '@/server/numerics/periodic/closest-rotation';

/** Periods that differ by more than this share belong to different orbits; crossings decide about the others. */
const PERIOD_WINDOW = 1e-6;

/** An entry of the catalogue, of the same system and parameters, as far as recognising it takes. */
export interface CatalogueOrbit {
  accession: string;
  /** u as a formula. */
  section: string;
  period: string;
  /** Counted crossings with 0 < t ≤ T in order of time; the last is the start. */
  crossings: { point: string[]; returnTime: string }[];
  itinerary: string | null;
}

interface Entry {
  section: string;
  points: Float64Array[];
  times: number[];
}

/**
 * Recognise an orbit among entries of the catalogue: the same, seen from another start or section, as the image under a
 * symmetry, or run through more than once.
 *
 * Two orbits are the same when at some rotation every crossing of one lies within max(10 tolerances, 1e-8) of the other's,
 * in sizes; neither the period nor one near crossing is enough.
 */
export function matchOrbits(claim: Claim, survey: Survey, entries: readonly CatalogueOrbit[]): OrbitMatch[] {
  const matcher = new Matcher(claim, survey);
  return entries.flatMap((entry) => matcher.match(entry) ?? []);
}

/** Say that the orbit is in the catalogue already. */
export function alreadyKnown(matches: readonly OrbitMatch[], isSubmission: boolean): Finding[] {
  const known = matches.find(({ relation }) => relation === 'same' || relation === 'same-other-start');
  if (known === undefined) return [];
  const seen = known.relation === 'same' ? '' : ', seen from another crossing or section';
  const found = finding('already-known', {
    message: `This is entry ${known.accession}${seen}: every crossing agrees within ${figure(known.distance)} of the extent.`,
    value: known.distance,
  });
  return [{ ...found, severity: isSubmission ? 'blocker' : 'note' }];
}

class Matcher {
  private readonly points: Float64Array[];
  private readonly limit: number;

  constructor(
    private readonly claim: Claim,
    private readonly survey: Survey,
  ) {
    this.points = survey.crossings.map(({ state }) => state);
    this.limit = Math.max(SAME_ORBIT, SAME_ORBIT_TOLERANCES * claim.tolerance);
  }

  match(catalogued: CatalogueOrbit): OrbitMatch | null {
    const ratio = this.survey.period / Number(catalogued.period);
    const times = Math.round(ratio);
    if (times < 1 || Math.abs(ratio - times) > PERIOD_WINDOW * times) return null;
    const entry = entryOf(catalogued, times);
    const found = this.same(entry) ?? this.image(entry);
    if (found === null) return null;
    const relation = times > 1 ? 'multiple-of' : found.relation;
    return {
      accession: catalogued.accession,
      relation,
      distance: found.distance,
      rotation: found.rotation,
      lettersDiffering: lettersDiffering(this.survey.itinerary, catalogued.itinerary),
      symmetry: found.symmetry,
    };
  }

  private same(entry: Entry): (Rotation & { relation: OrbitMatch['relation']; symmetry: null }) | null {
    const isSection = entry.section === this.claim.section;
    const own = isSection ? this.points : this.ownCrossingsOn(entry.section);
    const rotation = own === null ? null : this.lay(own, entry.points);
    if (rotation === null) return null;
    const relation = isSection && rotation.rotation === 0 ? 'same' : 'same-other-start';
    return { ...rotation, relation, symmetry: null };
  }

  private image(entry: Entry): (Rotation & { relation: OrbitMatch['relation']; symmetry: string }) | null {
    for (const symmetry of this.claim.symmetries) {
      const legs = this.imageLegs(entry, symmetry);
      const direct = symmetry.reversesTime
        ? null
        : this.lay(
            this.points,
            legs.map(({ end }) => end),
          );
      const rotation = direct ?? this.layLegs(legs);
      if (rotation !== null) return { ...rotation, relation: 'symmetric-image', symmetry: symmetry.name };
    }
    return null;
  }

  private lay(own: readonly Float64Array[], others: readonly Float64Array[]): Rotation | null {
    const { sizes } = this.survey;
    return closestRotation({ points: own, sizes, moduli: this.claim.moduli }, others, this.limit);
  }

  private layLegs(legs: readonly (Leg & { end: Float64Array })[]): Rotation | null {
    const crossings = crossingsOfLegs(this.claim.flow, legs);
    return crossings === null ? null : this.lay(this.points, crossings);
  }

  private ownCrossingsOn(section: string): Float64Array[] | null {
    const flow = this.claim.flowOn(section);
    if (flow === null) return null;
    const legs = this.survey.crossings.map(({ returnTime }, i, all) => ({
      start: i === 0 ? this.survey.start : all[i - 1]!.state,
      duration: returnTime,
    }));
    return crossingsOfLegs(flow, legs);
  }

  /** The image of the entry, cut at the images of its crossings; a symmetry that turns time round runs it backwards. */
  private imageLegs({ points, times }: Entry, symmetry: Symmetry): (Leg & { end: Float64Array })[] {
    const map = (x: Float64Array): Float64Array => {
      const values = this.claim.flow.outputs(x);
      return Float64Array.from(symmetry.outputs, (output) => values[output]!);
    };
    const images = points.map(map);
    const m = images.length;
    const legs = images.map((end, i) => ({ start: images[(i + m - 1) % m]!, duration: times[i]!, end }));
    if (!symmetry.reversesTime) return legs;
    return legs.map(({ start, duration, end }) => ({ start: end, duration, end: start })).reverse();
  }
}

function entryOf({ section, crossings }: CatalogueOrbit, times: number): Entry {
  const points = crossings.map(({ point }) => Float64Array.from(point, Number));
  const returnTimes = crossings.map(({ returnTime }) => Number(returnTime));
  return {
    section,
    points: Array.from({ length: times }, () => points).flat(),
    times: Array.from({ length: times }, () => returnTimes).flat(),
  };
}

/** Letters in which two itineraries differ at the rotation that suits them best; null where they cannot be compared. */
function lettersDiffering(own: string | null, other: string | null): number | null {
  if (own === null || other === null || own.length !== other.length) return null;
  if (own === other) return 0;
  let least = own.length;
  for (let shift = 0; shift < own.length; shift += 1) {
    let differing = 0;
    for (let i = 0; i < own.length && differing < least; i += 1) {
      if (own[i] !== other[(i + shift) % other.length]) differing += 1;
    }
    least = Math.min(least, differing);
  }
  return least;
}
