import type Piscina from 'piscina';
import type { CheckRequest, SystemDocument } from '@/schemas/generated/contract';
import type { Refinement, RefinementFailure } from '@/server/checks/refine-orbit';

/** An entry's orbit that is to be computed to many digits. */
export interface RefineTask {
  document: SystemDocument;
  /** The body as it was checked. */
  claim: CheckRequest;
  /** The orbit as double precision found it. */
  orbit: { point: string[]; period: string; crossings: { point: string[] }[] };
  digits: number;
  /** Computing time after which the computation ends itself. */
  seconds: number;
}

export interface RefineOutcome {
  result: Refinement | RefinementFailure;
  computeMs: number;
}

/**
 * The thread counts its own computing and ends itself. One that hangs is ended from outside, after this many times its
 * time: it computes only while nothing else has a use for the processor.
 */
const PATIENCE = 20;

/** Computes orbits to many digits, on a thread of its own, so that no check waits for one. */
export interface Refiner {
  /** Rejects with an `AbortError` when the time is over or the signal says so. */
  refine(task: RefineTask, signal: AbortSignal): Promise<RefineOutcome>;
  close(): Promise<void>;
}

/** A refiner whose thread starts with the first orbit. */
export function createRefiner(startPool: () => Piscina): Refiner {
  let pool: Piscina | null = null;
  return {
    async refine(task, signal) {
      pool ??= startPool();
      const limit = AbortSignal.timeout(task.seconds * 1000 * PATIENCE);
      return (await pool.run(task, { name: 'refine', signal: AbortSignal.any([limit, signal]) })) as RefineOutcome;
    },
    close: async () => {
      await pool?.destroy();
    },
  };
}
