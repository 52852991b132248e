import type Piscina from 'piscina';
import type { SystemDocument, Trace } from '@/schemas/generated/contract';
import type { TracedOrbit } from '@/server/checks/trace-orbit';

/** What is to be drawn: an orbit of a system. */
export interface TraceRequest extends TracedOrbit {
  document: SystemDocument;
  /** Points of the polyline. */
  points: number;
}

/** A drawing that takes longer is given up, and its thread ended. */
const LONGEST_MS = 10_000;

/** Follows orbits for drawing, on threads of its own, so that no request waits for another's arithmetic. */
export interface Tracer {
  /** The polyline, the crossings, and whether it closes. */
  trace(request: TraceRequest): Promise<Trace>;
  close(): Promise<void>;
}

/** A tracer whose threads start with the first drawing. */
export function createTracer(startPool: () => Piscina): Tracer {
  let pool: Piscina | null = null;
  return {
    async trace(request) {
      pool ??= startPool();
      const signal = AbortSignal.timeout(LONGEST_MS);
      return (await pool.run(request, { name: 'trace', signal })) as Trace;
    },
    close: async () => {
      await pool?.destroy();
    },
  };
}
