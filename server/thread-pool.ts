import { extname, join } from 'node:path';
import Piscina from 'piscina';

/** Memory of one thread; a computation that needs more is ended and the process lives on. */
const THREAD_MEMORY_MB = 512;

/** A thread takes a second to start and compiles what it needs: it is kept for the next task this long. */
const IDLE_MS = 600_000;

/**
 * Threads for computing. One stays alive from the start, so that the first check does not wait for it.
 *
 * The threads run the file that stands beside this one, by the same loader as this process.
 */
export function threadPool(threads: number): Piscina {
  const extension = extname(__filename);
  return new Piscina({
    filename: join(__dirname, `check-thread${extension}`),
    // Loaded when a thread starts; without it the pool looks for a default export, through a loader that knows no TypeScript.
    name: 'check',
    minThreads: 1,
    maxThreads: threads,
    idleTimeout: IDLE_MS,
    concurrentTasksPerWorker: 1,
    resourceLimits: { maxOldGenerationSizeMb: THREAD_MEMORY_MB },
    ...(extension === '.ts' ? { execArgv: ['--require', 'tsx/cjs'] } : {}),
  });
}
