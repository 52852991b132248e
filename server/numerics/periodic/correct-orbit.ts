import { closingCorrection, type ClosingCorrection } from '@/server/numerics/periodic/closing-correction';
import {
  condenseSegments,
  type CondensedChain,
  type EndRelation,
  type LinearSegment,
} from '@/server/numerics/periodic/condense-segments';
import { frobeniusNorm } from '@/server/numerics/periodic/frobenius-norm';
import { NewtonLog, type NewtonStep } from '@/server/numerics/periodic/newton-log';
import { periodDifferenceSize } from '@/server/numerics/periodic/period-difference-size';
import { planSegments } from '@/server/numerics/periodic/plan-segments';
import { planSingleShot } from '@/server/numerics/periodic/plan-single-shot';
import { scaleMatrix } from '@/server/numerics/periodic/scale-matrix';
import { shoot, type FlowFailure, type Shot, type ShotSegment } from '@/server/numerics/periodic/shoot';
import { type ShootingPlan } from '@/server/numerics/periodic/shooting-plan';
import { stateDifference } from '@/server/numerics/periodic/state-difference';
import { createSectionWatch, type SectionWatch } from '@/server/numerics/section/create-section-watch';
import { type Flow } from '@/server/numerics/taylor/flow';

/** Singular values at or below this share of the largest mean a family, not an isolated orbit. */
const RANK_CUT_OFF = 1e-9;

/**
 * A family's zero singular values are zero on the orbit only: elsewhere they are the closure times the curvature of the
 * flow, up to about this in close approaches (measured: Kepler of eccentricity 0.99, 1e5).
 */
const CLOSURE_MAGNIFIED = 1e6;

/** Where the closure falls no more with that, a direction was taken for free that is not: this much is then allowed for. */
const CLOSURE_HARDLY_MAGNIFIED = 1e2;

/** However far the orbit is from closing, a singular value above this is no zero. */
const COARSEST_CUT_OFF = 1e-3;

/** Newton steps, halvings included, before giving up; from a close start it takes two to five. */
const MAX_ITERATIONS = 16;

/** Corrections of inner nodes above this still leave more than rounding: their squares. */
const SMALL_INSIDE = 1e-6;

/** Derivatives taken this near the orbit are those of the orbit. */
const SAME_DERIVATIVES = 1e-13;

/** Where every segment fits, a correction up to this many times what they miss by is made of rounding. */
const ROUNDING_MAGNIFIED = 1e4;

/** No step moves a node by more than this share of the orbit, nor the period by more than this share of itself. */
const LONGEST_STEP = 0.25;

/** A corrected orbit smaller than this share of the one started from is an equilibrium. */
const STANDING = 1e-6;

/** A step that makes the closure worse is halved down to this share, unless the closure is rounding. */
const SHORTEST_STEP = 1 / 16;
const NOISE = 1e-8;

/** What a corrected segment may miss by: 1e-12 + 100 ulp ‖M‖, in sizes. */
const RESIDUAL_FLOOR = 1e-12;
const RESIDUAL_ROUNDING = 100;

/** A function of the state that a family's correction leaves at a value. */
export interface HeldQuantity {
  /** The value to be kept. */
  target: number;
  at(x: Float64Array): number;
  /** Gradient at x, n entries. */
  gradientAt(x: Float64Array): Float64Array;
}

/** Where segments begin, and how they are cut; the first node is the start. */
export interface ShootingChain {
  plan: ShootingPlan;
  nodes: Float64Array[];
}

/** An orbit to be corrected. */
export interface CorrectionInput {
  flow: Flow;
  start: Float64Array;
  period: number;
  /** Times at which the steps of a run over the period ended. */
  stepEnds: readonly number[];
  /** Nodes that are known to lie along the orbit; without them the run from the start makes its own. */
  chain?: ShootingChain | undefined;
  /** Kept where the orbit belongs to a family; without it the point moves as little as it can. */
  hold?: HeldQuantity | undefined;
  sizes: Float64Array;
  moduli: readonly (number | null)[];
  maxSteps: number;
  shouldStop?: (() => boolean) | undefined;
  onIteration?: ((iteration: number) => void) | undefined;
}

/** A corrected orbit with what was computed on the way. */
export interface CorrectedOrbit {
  converged: true;
  nodes: Float64Array[];
  plan: ShootingPlan;
  period: number;
  segments: ShotSegment[];
  /** The first run, as typed, in segments. */
  typed: ShotSegment[];
  relation: EndRelation;
  divergenceIntegral: number;
  watch: SectionWatch;
  iterations: number;
  residual: number;
  /** Below this a singular value of this orbit's relation counts as zero. */
  rankCutOff: number;
  freeDirections: number;
  /** Whether the quantity that was to be held is. */
  isHeld: boolean;
  /** See NewtonLog. */
  basinRatio: number | null;
  steps: number;
}

/** Why there is no corrected orbit. */
export interface FailedCorrection {
  converged: false;
  failure: FlowFailure | null;
  iterations: number;
  residual: number;
  /** The first run, as typed, in segments; empty where it failed. */
  typed: ShotSegment[];
  steps: number;
}

/**
 * Find the periodic orbit nearest to a point and a period by Newton's rule, in several segments where it is unstable.
 *
 * The first shot is one run over the period, or one from each node that is given; it is cut where its derivative grows
 * beyond 1e3, and from then on every segment is shot from its own node. The point's change is the shortest there is, the
 * period is free.
 *
 * @returns the orbit, when the last corrections fell at least tenfold, the last is below 1e-10 and every segment misses
 *          the next node by at most 1e-12 + 100 ulp ‖Mᵢ‖ in sizes; else why not.
 *
 * Accuracy: nodes within a few times the residual; see the README of the reference cases for what doubles can do.
 * Cost: one integration with variations a step, and one without at the end.
 * Source: multiple shooting (Stoer & Bulirsch, Introduction to Numerical Analysis, 7.3); J. Guckenheimer, B. Meloon, SIAM
 *         J. Sci. Comput. 22 (2000) 951–985, for Taylor series; segments by norm and the held point are ours.
 */
export function correctOrbit(input: CorrectionInput): CorrectedOrbit | FailedCorrection {
  return new Corrector(input).run();
}

class Corrector {
  private plan: ShootingPlan;
  private nodes: Float64Array[];
  private period: number;
  private segments: ShotSegment[] = [];
  private typed: ShotSegment[] = [];
  private relation: EndRelation | null = null;
  private divergenceIntegral = 0;
  private readonly log = new NewtonLog();
  private residual = Infinity;
  /** Where the last Newton step began, the closure there, and how much of the step was kept. */
  private lastStep: { nodes: Float64Array[]; period: number; residual: number; share: number } | null = null;
  private magnification = CLOSURE_MAGNIFIED;
  private steps = 0;

  constructor(private readonly input: CorrectionInput) {
    this.plan = input.chain?.plan ?? planSingleShot(input.stepEnds, input.period);
    this.nodes = input.chain?.nodes ?? [input.start];
    this.period = input.period;
  }

  run(): CorrectedOrbit | FailedCorrection {
    for (let iteration = 1; iteration <= MAX_ITERATIONS; iteration += 1) {
      this.input.onIteration?.(iteration);
      const shot = this.shot(true);
      if (!shot.ok) return this.failed(shot);
      this.take(shot, iteration === 1);
      if (this.wentTooFar()) continue;
      const correction = this.improve();
      if (!Number.isFinite(correction.inside) || this.period <= 0) return this.failed(null);
      this.log.add(correction);
      if (this.log.isSettled() && correction.inside <= SMALL_INSIDE && !this.isOfOneRun(iteration)) {
        const ended = this.finish(correction.inside > SAME_DERIVATIVES);
        if (ended !== null) return ended;
      }
      if (this.log.wandersOff()) return this.failed(null);
    }
    return this.failed(null);
  }

  /** Whether the segments are still those of one run over the period, whose rounding has grown with it. */
  private isOfOneRun(iteration: number): boolean {
    return iteration === 1 && this.plan.length > (this.input.chain?.plan.length ?? 1);
  }

  private shot(variations: boolean, watch?: SectionWatch): Shot | FlowFailure {
    const { flow, maxSteps, shouldStop } = this.input;
    const { plan, nodes, period } = this;
    const result = shoot({ flow, plan, nodes, period, variations, maxSteps, watch, shouldStop });
    this.steps += result.steps;
    return result;
  }

  private take(shot: Shot, isFirst: boolean): void {
    if (isFirst) {
      const cut = planSegments(shot, this.nodes, this.input);
      this.plan = cut.plan;
      this.nodes = cut.nodes;
      this.segments = cut.segments;
      this.typed = cut.segments;
    } else this.segments = shot.segments;
    this.divergenceIntegral = shot.divergenceIntegral;
  }

  /** Segment ends minus the next nodes, in sizes; keeps the largest as the residual. */
  private defects(): Float64Array[] {
    const { sizes, moduli } = this.input;
    const defects = this.segments.map(({ end }, i) => {
      const next = this.nodes[i + 1] ?? this.nodes[0]!;
      return stateDifference(end, next, moduli).difference.map((entry, j) => entry / sizes[j]!);
    });
    this.residual = Math.max(...defects.map(largestEntry));
    return defects;
  }

  private condense(defects: readonly Float64Array[]): CondensedChain {
    const chain = condenseSegments(this.segments.map((segment, i) => this.linear(segment, i, defects[i]!)));
    this.relation = chain.relation;
    return chain;
  }

  private linear({ end, monodromy }: ShotSegment, index: number, defect: Float64Array): LinearSegment {
    const { flow, sizes } = this.input;
    const { borders } = this.plan[index]!;
    const duration = (borders.at(-1)! - borders[0]!) * this.period;
    const v = flow.field(end).map((entry, i) => (entry * duration) / sizes[i]!);
    return { m: scaleMatrix(monodromy!, sizes), v, defect };
  }

  private rankCutOff(): number {
    return Math.min(COARSEST_CUT_OFF, Math.max(RANK_CUT_OFF, this.magnification * this.residual));
  }

  private closing(): ClosingCorrection {
    const { flow, sizes, hold } = this.input;
    const first = this.nodes[0]!;
    const scaled = (gradient: Float64Array): Float64Array => gradient.map((entry, i) => entry * sizes[i]!);
    const section = { gradient: scaled(flow.sectionGradient(first)), value: flow.section(first) };
    const held =
      hold === undefined ? null : { gradient: scaled(hold.gradientAt(first)), value: hold.at(first) - hold.target };
    return closingCorrection(this.relation!, section, this.rankCutOff(), { hold: held });
  }

  /** Take one Newton step. */
  private improve(): NewtonStep {
    const defects = this.defects();
    const { residual, lastStep } = this;
    const fits = this.fits(defects);
    if (!fits && lastStep !== null && residual > lastStep.residual / 2) this.magnification = CLOSURE_HARDLY_MAGNIFIED;
    const chain = this.condense(defects);
    const { first, theta } = this.closing();
    const moved = this.move(chain.recover(first, first, theta), theta);
    return { ...moved, isRounding: fits && moved.size <= ROUNDING_MAGNIFIED * residual };
  }

  /** Go back half of the last step where it made the closure worse; a short one is kept. */
  private wentTooFar(): boolean {
    this.defects();
    const { lastStep } = this;
    if (lastStep === null || lastStep.share < SHORTEST_STEP) return false;
    if (this.residual < NOISE || this.residual <= lastStep.residual) return false;
    this.nodes = this.nodes.map((node, i) => node.map((value, j) => (value + lastStep.nodes[i]![j]!) / 2));
    this.period = (this.period + lastStep.period) / 2;
    this.lastStep = { ...lastStep, share: lastStep.share / 2 };
    return true;
  }

  private move(changes: readonly Float64Array[], theta: number): { size: number; inside: number } {
    const { flow, sizes } = this.input;
    const field = flow.field(this.nodes[0]!);
    const ofPeriod = periodDifferenceSize(theta * this.period, this.period, field, sizes);
    const inside = Math.max(ofPeriod, ...changes.map(largestEntry));
    const share = Math.min(1, LONGEST_STEP / Math.max(Math.abs(theta), ...changes.map(largestEntry)));
    this.lastStep = { nodes: this.nodes, period: this.period, residual: this.residual, share: 1 };
    this.nodes = this.nodes.map((node, i) => node.map((value, j) => value + share * changes[i]![j]! * sizes[j]!));
    this.period += share * theta * this.period;
    return { size: Math.max(ofPeriod, largestEntry(changes[0]!)), inside };
  }

  /** Integrate the corrected orbit and judge it; null when another Newton step may help. */
  private finish(renew: boolean): CorrectedOrbit | FailedCorrection | null {
    const watch = createSectionWatch(this.input.flow.dimension);
    const shot = this.shot(renew, watch);
    if (!shot.ok) return this.failed(shot);
    this.segments = this.segments.map((old, i) => (renew ? shot.segments[i]! : { ...old, end: shot.segments[i]!.end }));
    if (renew) this.divergenceIntegral = shot.divergenceIntegral;
    const defects = this.defects();
    if (!this.fits(defects)) return null;
    if (!this.log.fellFast() || this.standsStill(watch)) return this.failed(null);
    if (renew) this.condense(defects);
    const { nodes, plan, period, segments, typed, divergenceIntegral, residual, steps } = this;
    const relation = this.relation!;
    return {
      converged: true,
      ...{ nodes, plan, period, segments, typed, relation, divergenceIntegral, watch, residual, steps },
      iterations: this.log.length,
      basinRatio: this.log.basinRatio(),
      rankCutOff: this.rankCutOff(),
      ...this.family(),
    };
  }

  private family(): Pick<CorrectedOrbit, 'freeDirections' | 'isHeld'> {
    const { freeDirections, isHeld } = this.closing();
    return { freeDirections, isHeld };
  }

  /** Whether every segment meets the next node as nearly as its growth lets it. */
  private fits(defects: readonly Float64Array[]): boolean {
    return defects.every((defect, i) => {
      const norm = frobeniusNorm(scaleMatrix(this.segments[i]!.monodromy!, this.input.sizes));
      return largestEntry(defect) <= RESIDUAL_FLOOR + RESIDUAL_ROUNDING * Number.EPSILON * norm;
    });
  }

  /** Whether Newton ended on an equilibrium, which closes after any time. */
  private standsStill(watch: SectionWatch): boolean {
    const { lowest, highest } = watch.extent();
    return this.input.sizes.every((size, i) => highest[i]! - lowest[i]! < STANDING * size);
  }

  private failed(failure: FlowFailure | null): FailedCorrection {
    const { residual, typed, steps } = this;
    return { converged: false, failure, iterations: this.log.length, residual, typed, steps };
  }
}

function largestEntry(x: Float64Array): number {
  return x.reduce((size, entry) => Math.max(size, Math.abs(entry)), 0);
}
