import { type OdexSolver, Solver } from '../../support/odex';
import type { Polynomial } from './polynomial';

/** What a second integrator is asked for, and is off by at most in each step. */
const STEP_ERROR = 1e-13;
/** Places in a step of odex at which u is looked at. */
const SAMPLES = 100;
/** The field's growth and the slope of u are looked at at every so many of them. */
const COARSE = 20;
/** A solution beyond this is given up. */
const FAR = 30;

export interface PolynomialFlow {
  field: readonly Polynomial[];
  section: Polynomial;
  start: readonly number[];
  duration: number;
}

interface Zero {
  time: number;
  state: number[];
  direction: number;
  /** du/dt. */
  slope: number;
}

/** What another integrator makes of a flow. */
export interface SecondRun {
  end: number[];
  /** ∂ end_i / ∂ x0_j at i n + j. */
  monodromy: number[];
  zeros: Zero[];
  /** Bound of the error of a state, from the errors of the steps and the largest growth that the field allows. */
  error: number;
  /** The same for the derivatives, in units of the largest of them. */
  growth: number;
  /** Smallest |u|, in units of its largest, at an extremum that does not cross, and |du/dt| at a zero likewise. */
  margin: number;
}

/**
 * Follow a flow by extrapolation of the midpoint rule (odex), with its variational equations and the zeros of u.
 *
 * @returns null when the solution goes far away or odex gives up.
 */
export function followWithOdex(flow: PolynomialFlow): SecondRun | null {
  return new OdexRun(flow).run();
}

class OdexRun {
  private readonly n: number;
  private readonly zeros: Zero[] = [];
  private steps = 0;
  private logGrowth = 0;
  private largest = 0;
  private largestSlope = 0;
  private readonly dips: number[] = [];
  private previous: number[];

  constructor(private readonly flow: PolynomialFlow) {
    this.n = flow.start.length;
    this.previous = [...flow.start, ...identity(this.n)];
  }

  run(): SecondRun | null {
    const { duration } = this.flow;
    const solver = solverOf(this.previous.length);
    solver.denseOutput = true;
    const { y, outcome } = solver.solve(this.derivatives, 0, this.previous, duration, (...step) => {
      const [, before, t, state, dense] = step;
      if (state.slice(0, this.n).some((x) => !(Math.abs(x) < FAR))) return false;
      if (t > before) this.look(before, t, dense);
      this.previous = [...state];
      return undefined;
    });
    if (outcome !== 0) return null;
    const slopes = this.zeros.map(({ slope }) => Math.abs(slope) / this.largestSlope);
    const growth = Math.exp(this.logGrowth);
    return {
      end: y.slice(0, this.n),
      monodromy: y.slice(this.n),
      zeros: this.zeros,
      error: this.steps * STEP_ERROR * growth * (1 + Math.max(...y.map(Math.abs))),
      growth,
      margin: Math.min(1, ...slopes, ...this.dips.map((dip) => dip / this.largest)),
    };
  }

  /** x' = f(x), M' = Df(x) M. */
  private readonly derivatives = (_: number, y: number[]): number[] => {
    const { n } = this;
    const x = y.slice(0, n);
    const rows = this.flow.field.map((f) => f.gradient(x));
    const varied = rows.flatMap((row) =>
      Array.from({ length: n }, (_unused, j) => row.reduce((sum, slope, k) => sum + slope * y[n + k * n + j]!, 0)),
    );
    return [...this.flow.field.map((f) => f.at(x)), ...varied];
  };

  /** Look at one step: zeros and dips of u, and how much the field can make errors grow. */
  private look(before: number, t: number, dense: (i: number, t: number) => number): void {
    const { n, flow } = this;
    this.steps += 1;
    const width = (t - before) / SAMPLES;
    const states = Array.from({ length: SAMPLES + 1 }, (_, k) =>
      Array.from({ length: n }, (_unused, i) => dense(i, before + k * width)),
    );
    for (let k = 0; k <= SAMPLES; k += COARSE) {
      const jacobian = flow.field.map((f) => f.gradient(states[k]!));
      this.logGrowth += Math.max(0, logarithmicNorm(jacobian)) * width * COARSE;
      this.largestSlope = Math.max(this.largestSlope, Math.abs(slopeOf(flow, states[k]!)));
    }
    const values = states.map((x) => flow.section.at(x));
    values.forEach((u, k) => {
      this.largest = Math.max(this.largest, Math.abs(u));
      const beside = [values[k - 1], values[k + 1]];
      const isDip = beside.every((v) => v !== undefined && v * u > 0 && Math.abs(v) >= Math.abs(u));
      if (isDip) this.dips.push(Math.abs(u));
    });
    for (let k = 0; k < SAMPLES; k++) {
      if (Math.sign(values[k]!) === Math.sign(values[k + 1]!)) continue;
      this.zeros.push(this.polish(before, before + (k + 0.5) * width));
    }
  }

  /** Newton on u, with the state integrated anew from the start of the step each time. */
  private polish(before: number, guess: number): Zero {
    const { n, flow } = this;
    const solver = solverOf(n);
    const field = (_: number, x: number[]): number[] => flow.field.map((f) => f.at(x));
    let time = guess;
    for (let round = 0; ; round++) {
      const state = time === before ? this.previous : solver.solve(field, before, this.previous.slice(0, n), time).y;
      const x = state.slice(0, n);
      const slope = slopeOf(flow, x);
      const step = flow.section.at(x) / slope;
      if (round === 6 || Math.abs(step) < 1e-16) return { time, state: x, direction: Math.sign(slope), slope };
      time -= step;
    }
  }
}

function solverOf(dimension: number): OdexSolver {
  const solver = new Solver(dimension);
  solver.absoluteTolerance = STEP_ERROR;
  solver.relativeTolerance = STEP_ERROR;
  return solver;
}

const identity = (n: number): number[] => Array.from({ length: n * n }, (_, at) => (at % (n + 1) === 0 ? 1 : 0));

/** du/dt. */
function slopeOf({ field, section }: PolynomialFlow, x: readonly number[]): number {
  return section.gradient(x).reduce((sum, slope, i) => sum + slope * field[i]!.at(x), 0);
}

/** Bound, by Gershgorin's discs, of the largest eigenvalue of (J + Jᵀ)/2: no distance grows quicker (Ważewski). */
function logarithmicNorm(jacobian: readonly number[][]): number {
  return Math.max(
    ...jacobian.map((row, i) =>
      row.reduce((sum, entry, j) => sum + (i === j ? entry : Math.abs(entry + jacobian[j]![i]!) / 2), 0),
    ),
  );
}
