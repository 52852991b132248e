import { MessageChannel } from 'node:worker_threads';
import type { Task } from 'graphile-worker';
import type Piscina from 'piscina';
import type { CheckReport, SystemDocument } from '@/schemas/generated/contract';
import type { CheckTask } from '@/server/check-thread';
import type { CheckProgress } from '@/server/checks/check-progress';
import { overrunReport } from '@/server/jobs/overrun-report';
import { isThreadLimit, messageOf } from '@/server/jobs/thread-limit';
import type { Log } from '@/server/log';
import type { OrbitCheck } from '@/server/models/orbit-check';
import { catalogueNear } from '@/server/services/catalogue-near';
import { TRIES } from '@/server/services/check-limits';
import type { Desk } from '@/server/services/desk';
import { systemVersion } from '@/server/services/known-system';
import { beginCheck, failCheck, finishCheck, giveBackCheck, noteProgress } from '@/server/services/run-check';

/** What the job works with. */
export interface CheckTools {
  desk: Desk;
  threads: Piscina;
  log: Log;
  /** Aborted when the process is to end: a running check is given back to the queue. */
  stopping: AbortSignal;
}

/** A thread that has not ended itself so long after its time is ended from outside; it may have had to start first. */
const GRACE_MS = 5_000;

/** The job that checks one orbit and stores the report. */
export function checkOrbitJob(tools: CheckTools): Task {
  return async (payload, { job }) => {
    const check = await beginCheck(tools.desk.db, (payload as { check: string }).check);
    if (!check) return;
    try {
      const { report, computeMs } = await compute(tools, check);
      await finishCheck(tools.desk, check, { report, computeMs });
    } catch (error) {
      if (tools.stopping.aborted) return giveBackCheck(tools.desk.db, check);
      tools.log.error({ err: error, check: check.id, attempt: job.attempts }, 'a check broke off');
      if (job.attempts < TRIES) throw error;
      await failCheck(tools.desk, check, `The computation broke off on our side, ${TRIES} times: ${messageOf(error)}`);
    }
  };
}

async function compute(tools: CheckTools, check: OrbitCheck): Promise<{ report: CheckReport; computeMs: number }> {
  const { db } = tools.desk;
  const { body, systemId, systemVersion: version } = check;
  const known = systemId !== null && version !== null ? await systemVersion(db, systemId, version) : null;
  const document = known ? known.checked.document : (body.system as SystemDocument);
  const catalogue = known ? await catalogueNear(db, known, body) : [];
  const isSubmission = check.submissionId !== null;
  const { port1, port2 } = new MessageChannel();
  let latest: CheckProgress | null = null;
  port1.on('message', (progress: CheckProgress) => {
    latest = progress;
    noteProgress(db, check.id, progress).catch((error: unknown) => tools.log.warn({ err: error }, 'progress'));
  });
  const task: CheckTask = { document, body, isSubmission, catalogue, seconds: check.seconds, progress: port2 };
  const startedAt = Date.now();
  try {
    const report = await inThread(tools, task, port2);
    return { report, computeMs: report.engine.cpuMs };
  } catch (error) {
    const computeMs = Date.now() - startedAt;
    if (tools.stopping.aborted || !isThreadLimit(error)) throw error;
    return { report: overrunReport({ seconds: check.seconds, computeMs, latest }), computeMs };
  } finally {
    port1.close();
  }
}

/** Run a check in a thread of the pool; the thread is ended when it overruns or the process stops. */
async function inThread(
  { threads, stopping }: CheckTools,
  task: CheckTask,
  port: CheckTask['progress'],
): Promise<CheckReport> {
  const limit = new AbortController();
  const timer = setTimeout(() => limit.abort(), task.seconds * 1000 + GRACE_MS);
  try {
    const signal = AbortSignal.any([limit.signal, stopping]);
    return (await threads.run(task, { name: 'check', signal, transferList: [port] })) as CheckReport;
  } finally {
    clearTimeout(timer);
  }
}
