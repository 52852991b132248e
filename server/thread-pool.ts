import { extname, join } from 'node:path';
import Piscina from 'piscina';

/** Memory of one thread; a computation that needs more is ended and the process lives on. */
const THREAD_MEMORY_MB = 512;

/**
 * Threads for computing. One stays alive from the start, so that the first check does not wait for it.
 *
 * The threads run the file that stands beside this one, by the same loader as this process.
 */
export function threadPool(threads: number): Piscina {
  const extension = extname(__filename);
  return new Piscina({
    filename: join(__dirname, `check-thread${extension}`),
    minThreads: 1,
    maxThreads: threads,
    concurrentTasksPerWorker: 1,
    resourceLimits: { maxOldGenerationSizeMb: THREAD_MEMORY_MB },
    ...(extension === '.ts' ? { execArgv: ['--import', 'tsx'] } : {}),
  });
}
