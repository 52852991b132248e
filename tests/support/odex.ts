import { createRequire } from 'node:module';

/**
 * What is told after every step: its number, the times before and after it, y, and an interpolation of component i between
 * the two times. False as an answer ends the run.
 */
type OdexStep = [number: number, before: number, t: number, y: number[], dense: (i: number, t: number) => number];

export interface OdexSolver {
  absoluteTolerance: number;
  relativeTolerance: number;
  maxSteps: number;
  denseOutput: boolean;
  /** @returns y at `to`; outcome 0 when it was reached. */
  solve(
    f: (t: number, y: number[]) => number[],
    from: number,
    y: number[],
    to: number,
    onStep?: (...step: OdexStep) => boolean | undefined,
  ): { y: number[]; outcome: number };
}

/** An integrator that is not ours. The package is required and typed here: its own sources do not pass a strict compiler. */
export const { Solver } = createRequire(__filename)('odex') as { Solver: new (dimension: number) => OdexSolver };
