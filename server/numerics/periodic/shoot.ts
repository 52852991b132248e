import { multiplyMatrices } from '@/server/numerics/linear/multiply-matrices';
import { type ShootingPlan } from '@/server/numerics/periodic/shooting-plan';
import { type SectionWatch } from '@/server/numerics/section/create-section-watch';
import { type Flow, type FlowResult, type TaylorStep } from '@/server/numerics/taylor/flow';

/** A piece whose volume shrinks or grows by more than exp of this is halved: its derivative would drown in rounding. */
const MAX_VOLUME_LOG = 9;

/** A piece in which some direction grows beyond this is halved as well, before it drowns all others. */
const MAX_GROWTH = 1e4;

/** How often a piece may be halved. */
const MAX_HALVINGS = 8;

/** Why a run ended early. */
export type FlowFailure = Extract<FlowResult, { ok: false }>;

/** What is to be integrated. */
export interface ShootOptions {
  flow: Flow;
  plan: ShootingPlan;
  /** Start of each segment, n coordinates each. */
  nodes: readonly Float64Array[];
  period: number;
  /** Whether derivatives by the start are wanted. */
  variations: boolean;
  /** Steps allowed in all. */
  maxSteps: number;
  watch?: SectionWatch | undefined;
  shouldStop?: (() => boolean) | undefined;
}

/** One segment as integrated. */
export interface ShotSegment {
  end: Float64Array;
  /** Borders of its pieces as integrated, as shares of the period: those planned and the halvings. */
  borders: number[];
  /** Start of each piece; the first is the node. */
  starts: Float64Array[];
  /** Derivative of each piece's end by its start, n × n; empty without variations. */
  pieces: Float64Array[];
  /** Product of the pieces; null without variations. */
  monodromy: Float64Array | null;
  /** End of the run that the derivative belongs to, from starts[0]; `end` itself unless it was computed again. */
  derivedEnd: Float64Array;
}

/** All segments as integrated. */
export interface Shot {
  ok: true;
  segments: ShotSegment[];
  divergenceIntegral: number;
  steps: number;
}

/**
 * Integrate every segment of a plan from its own node.
 *
 * @returns the segments, or the failure of the first run that ended early, its time counted from the orbit's start.
 *
 * Cost: one integration over the period.
 */
export function shoot(options: ShootOptions): Shot | FlowFailure {
  const run = new Run(options);
  const segments: ShotSegment[] = [];
  for (const [index, planned] of options.plan.entries()) {
    const node = options.nodes[index]!;
    const borders = options.variations ? planned.borders : [planned.borders[0]!, planned.borders.at(-1)!];
    const segment: ShotSegment = {
      ...{ end: node, borders: [borders[0]!], starts: [], pieces: [] },
      ...{ monodromy: null, derivedEnd: node },
    };
    for (let k = 0; k + 1 < borders.length; k += 1) {
      const failure = run.piece(segment, { from: borders[k]!, to: borders[k + 1]! }, 0);
      if (failure !== null) return failure;
    }
    if (options.variations) segment.monodromy = product(segment.pieces, options.flow.dimension);
    segment.derivedEnd = segment.end;
    segments.push(segment);
  }
  return { ok: true, segments, divergenceIntegral: run.divergenceIntegral, steps: run.steps };
}

function product(pieces: readonly Float64Array[], n: number): Float64Array {
  return pieces.reduce((earlier, later) => multiplyMatrices(later, earlier, n, n));
}

class Run {
  steps = 0;
  divergenceIntegral = 0;

  constructor(private readonly options: ShootOptions) {}

  /** Integrate one piece from the segment's end so far; halve it where it shrinks too much. */
  piece(segment: ShotSegment, share: { from: number; to: number }, depth: number): FlowFailure | null {
    const { flow, period, variations, maxSteps, watch, shouldStop } = this.options;
    const begin = share.from * period;
    const start = segment.end;
    watch?.begin({ time: begin, timeLow: 0, onSection: begin === 0 });
    const result = flow.integrate({
      start,
      duration: share.to * period - begin,
      variations,
      maxSteps: Math.max(1, maxSteps - this.steps),
      ...(watch === undefined ? {} : { onStep: (step: TaylorStep) => watch.onStep(step) }),
      ...(shouldStop === undefined ? {} : { shouldStop }),
    });
    this.steps += result.steps;
    const mayHalve = variations && watch === undefined && depth < MAX_HALVINGS;
    // A derivative beyond the range of doubles looks like a singularity; a shorter piece tells.
    if (!result.ok && mayHalve && result.reason === 'singularity') return this.halves(segment, share, depth);
    if (!result.ok) return { ...result, t: begin + result.t };
    const { monodromy } = result;
    if (monodromy !== null && mayHalve) {
      const isLong = Math.abs(result.divergenceIntegral) > MAX_VOLUME_LOG || !(growthOf(monodromy) <= MAX_GROWTH);
      if (isLong) return this.halves(segment, share, depth);
    }
    this.divergenceIntegral += result.divergenceIntegral;
    segment.starts.push(start);
    segment.borders.push(share.to);
    if (monodromy !== null) segment.pieces.push(monodromy);
    segment.end = result.end;
    return null;
  }

  private halves(segment: ShotSegment, { from, to }: { from: number; to: number }, depth: number): FlowFailure | null {
    const middle = (from + to) / 2;
    return this.piece(segment, { from, to: middle }, depth + 1) ?? this.piece(segment, { from: middle, to }, depth + 1);
  }
}

/** √ of the largest |mᵢⱼ mⱼᵢ|: a size of growth that no choice of units changes. */
function growthOf(m: Float64Array): number {
  const n = Math.sqrt(m.length);
  let largest = 0;
  for (let i = 0; i < n; i += 1) {
    for (let j = i; j < n; j += 1) {
      const product = Math.abs(m[i * n + j]! * m[j * n + i]!);
      if (!(product <= largest)) largest = product;
    }
  }
  return Math.sqrt(largest);
}
