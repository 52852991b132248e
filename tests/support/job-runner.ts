import { EventEmitter } from 'node:events';
import { Logger, run, type Runner } from 'graphile-worker';
import { installSystems } from '@/server/demo/install-systems';
import { checkOrbitJob } from '@/server/jobs/check-orbit';
import { refineOrbitJob } from '@/server/jobs/refine-orbit';
import { createRefiner } from '@/server/services/refiner';
import { threadPool } from '@/server/thread-pool';
import type { TestApp } from './test-app';

/** Checks run as a worker runs them, in threads, beside a test application. */
export interface JobRunner {
  stop(): Promise<void>;
}

/** Put the built-in systems in place and begin to take check jobs, and those of refinements where a test is about them. */
export async function startJobs(t: TestApp, { refining = false } = {}): Promise<JobRunner> {
  const { db, config, log } = t.dependencies;
  await installSystems(db);
  const threads = threadPool(2);
  const refiner = createRefiner(() => threadPool(1));
  const stopping = new AbortController();
  const runner: Runner = await run({
    connectionString: t.database.url,
    concurrency: 2,
    pollInterval: 200,
    noHandleSignals: true,
    events: new EventEmitter(),
    logger: new Logger(() => () => undefined),
    taskList: {
      'check-orbit': checkOrbitJob({
        desk: { db, publicUrl: config.publicUrl },
        threads,
        log,
        stopping: stopping.signal,
      }),
      ...(refining && { 'refine-orbit': refineOrbitJob({ db, refiner, log, stopping: stopping.signal }) }),
    },
  });
  return {
    stop: async () => {
      stopping.abort();
      await runner.stop();
      await Promise.all([threads.destroy(), refiner.close()]);
    },
  };
}
