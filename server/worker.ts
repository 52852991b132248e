import { randomUUID } from 'node:crypto';
import { EventEmitter } from 'node:events';
import { Logger, run, type Runner, type WorkerEvents } from 'graphile-worker';
import { Pool } from 'pg';
import { Sequelize } from 'sequelize';
import { readConfig, requireDatabaseUrl } from '@/server/config';
import { installContent } from '@/server/demo/install-content';
import { checkOrbitJob } from '@/server/jobs/check-orbit';
import { cutReleaseJob } from '@/server/jobs/cut-release';
import { refineOrbitJob } from '@/server/jobs/refine-orbit';
import { sendDigestsJob } from '@/server/jobs/send-digests';
import { sendMail } from '@/server/jobs/send-mail';
import { tidyUp } from '@/server/jobs/tidy-up';
import { createLog } from '@/server/log';
import { createMailer } from '@/server/mail/mailer';
import { defineModels } from '@/server/models';
import { createCheckWatch } from '@/server/services/check-watch';
import type { Desk } from '@/server/services/desk';
import { createRefiner } from '@/server/services/refiner';
import { createTracer } from '@/server/services/tracer';
import { beat, BEAT_EVERY_MS, leave, takeOverJobs } from '@/server/services/worker-life';
import { threadPool } from '@/server/thread-pool';

/** Jobs beside the checks: mails, housekeeping. */
const OTHER_JOBS = 2;
/** Threads that draw what the demo accepts; they start when there is something to draw. */
const DRAWING_THREADS = 1;
/** Threads that compute many digits; one starts when there is something to compute. */
const REFINING_THREADS = 1;
/** A running check may finish for so long after the order to stop; then it goes back to the queue. */
const FINISH_MS = 3_000;
/** The process is gone this long after the order to stop, whatever hangs. */
const STOP_PATIENCE_MS = 15_000;
const POLL_MS = 1_000;
/** Housekeeping every minute; the curators' mail at six in the morning (UTC), or once it is possible that day. */
const TIMETABLE = ['* * * * * tidy-up', '0 6 * * * send-digests ?fill=1d'].join('\n');

const config = readConfig();
const log = createLog(config, 'worker');
const databaseUrl = requireDatabaseUrl(config);
const concurrency = config.workerThreads + OTHER_JOBS + REFINING_THREADS;
const pool = new Pool({ connectionString: databaseUrl, max: concurrency + 2 });
pool.on('error', (error) => log.warn({ err: error }, 'an idle connection to the database was lost'));
pool.on('connect', (client) => client.on('error', (error) => log.warn({ err: error }, 'a connection was lost')));
const db = new Sequelize(databaseUrl, { dialect: 'postgres', logging: false, pool: { max: concurrency + 2 } });
defineModels(db);

const desk: Desk = { db, publicUrl: config.publicUrl };
const threads = threadPool(config.workerThreads);
const tracer = createTracer(() => threadPool(DRAWING_THREADS));
const refiner = createRefiner(() => threadPool(REFINING_THREADS));
const checks = createCheckWatch(databaseUrl, log);
const mailer = createMailer(config);
const stopping = new AbortController();
const id = randomUUID();
const queueIds: string[] = [];
const events: WorkerEvents = new EventEmitter();
events.on('worker:create', ({ worker }) => queueIds.push(worker.workerId));

const queueOptions = () => ({
  pgPool: pool,
  pollInterval: POLL_MS,
  noHandleSignals: true,
  events,
  logger: queueLogger(),
});

/** A check job for each thread, so that none waits for one while its time runs; the other jobs beside them. */
const startRunners = (): Promise<Runner[]> => {
  const options = queueOptions();
  const checkOrbit = checkOrbitJob({ desk, threads, log, stopping: stopping.signal });
  return Promise.all([
    run({ ...options, concurrency: config.workerThreads, taskList: { 'check-orbit': checkOrbit } }),
    run({
      ...options,
      concurrency: OTHER_JOBS,
      crontab: TIMETABLE,
      taskList: {
        'send-mail': sendMail(mailer),
        'tidy-up': tidyUp(desk),
        'send-digests': sendDigestsJob(desk),
        'cut-release': cutReleaseJob({ pool, publicUrl: config.publicUrl, log }),
      },
    }),
  ]);
};

/** Refinements begin once the content is in place, so that a first start is not kept from being ready. */
async function startRefining({ runners }: Started): Promise<void> {
  const refineOrbit = refineOrbitJob({ db, refiner, log, stopping: stopping.signal });
  const taskList = { 'refine-orbit': refineOrbit };
  const runner = await run({ ...queueOptions(), concurrency: REFINING_THREADS, taskList });
  runner.promise.catch((error: unknown) => log.error({ err: error }, 'the queue ended'));
  if (isStopping) await runner.stop();
  else runners.push(runner);
}

function queueLogger(): Logger {
  // The names of the levels; the package does not export its enumeration.
  const kept: readonly string[] = ['error', 'warning'];
  return new Logger(() => (level, message, meta) => {
    if (kept.includes(level)) log[level === kept[0] ? 'error' : 'warn'](meta ?? {}, message);
  });
}

interface Started {
  runners: Runner[];
  heart: NodeJS.Timeout;
}

async function start(): Promise<Started> {
  await beat(db, { id, queueIds });
  const runners = await startRunners();
  const live = (): Promise<unknown> => beat(db, { id, queueIds }).then(() => takeOverJobs(desk));
  await live();
  const heart = setInterval(() => {
    live().catch((error: unknown) => log.warn({ err: error }, 'heartbeat'));
  }, BEAT_EVERY_MS);
  for (const { promise } of runners) {
    promise.catch((error: unknown) => log.error({ err: error }, 'the queue ended'));
  }
  log.info(`at work with ${config.workerThreads} threads`);
  return { runners, heart };
}

async function stop({ runners, heart }: Started): Promise<void> {
  log.info('stopping');
  setTimeout(() => process.exit(1), STOP_PATIENCE_MS).unref();
  const giveBack = setTimeout(() => stopping.abort(), FINISH_MS);
  await Promise.all(runners.map((runner) => runner.stop()));
  clearTimeout(giveBack);
  clearInterval(heart);
  await leave(db, id);
  await Promise.all([
    threads.destroy(),
    tracer.close(),
    refiner.close(),
    mailer.close(),
    checks.close(),
    db.close(),
    pool.end(),
  ]);
}

const started = start();
let isStopping = false;
for (const signal of ['SIGINT', 'SIGTERM'] as const) {
  process.on(signal, () => {
    if (isStopping) return;
    isStopping = true;
    started.then(stop).then(
      () => process.exit(0),
      (error: unknown) => {
        log.error({ err: error }, 'stopping');
        process.exit(1);
      },
    );
  });
}
started
  .then(() => installContent({ config, desk, tracer, checks, log, signal: stopping.signal }))
  .then(async () => startRefining(await started))
  .catch((error: unknown) => {
    if (isStopping) return;
    log.fatal({ err: error }, 'the worker cannot go on');
    process.exit(1);
  });
