import { EventEmitter } from 'node:events';
import { Logger, run, type Runner } from 'graphile-worker';
import { installSystems } from '@/server/demo/install-systems';
import { checkOrbitJob } from '@/server/jobs/check-orbit';
import { threadPool } from '@/server/thread-pool';
import type { TestApp } from './test-app';

/** Checks run as a worker runs them, in threads, beside a test application. */
export interface JobRunner {
  stop(): Promise<void>;
}

/** Put the built-in systems in place and begin to take check jobs. */
export async function startJobs(t: TestApp): Promise<JobRunner> {
  const { db, config, log } = t.dependencies;
  await installSystems(db);
  const threads = threadPool(2);
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
    },
  });
  return {
    stop: async () => {
      stopping.abort();
      await runner.stop();
      await threads.destroy();
    },
  };
}
