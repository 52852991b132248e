import type Piscina from 'piscina';
import type { Trace } from '@/schemas/generated/contract';
import type { TraceRequest } from '@/server/checks/trace-orbit';

/** Longest computing for one drawing. */
const SECONDS = 5;
/** A thread that does not end by itself is ended so much later. */
const GRACE_MS = 1_000;

/** Follows orbits for drawing, on threads of its own, so that no request waits for another's arithmetic. */
export interface Tracer {
  /** Everything of a trace but whether the orbit closes. */
  trace(request: TraceRequest): Promise<Omit<Trace, 'closes'>>;
  close(): Promise<void>;
}

/** A tracer whose threads start with the first drawing. */
export function createTracer(startPool: () => Piscina): Tracer {
  let pool: Piscina | null = null;
  return {
    async trace(request) {
      pool ??= startPool();
      const signal = AbortSignal.timeout(SECONDS * 1000 + GRACE_MS);
      return (await pool.run({ request, seconds: SECONDS }, { name: 'trace', signal })) as Omit<Trace, 'closes'>;
    },
    close: async () => {
      await pool?.destroy();
    },
  };
}
