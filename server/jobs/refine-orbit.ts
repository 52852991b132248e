import type { Task } from 'graphile-worker';
import type { Sequelize } from 'sequelize';
import { isThreadLimit, messageOf } from '@/server/jobs/thread-limit';
import type { Log } from '@/server/log';
import type { Refinement } from '@/server/models/refinement';
import { TRIES } from '@/server/services/check-limits';
import type { RefineOutcome, Refiner } from '@/server/services/refiner';
import {
  beginRefinement,
  failRefinement,
  finishRefinement,
  giveBackRefinement,
  refineTask,
} from '@/server/services/run-refinement';

/** What the job works with. */
interface RefineTools {
  db: Sequelize;
  refiner: Refiner;
  log: Log;
  /** Aborted when the process is to end: a running refinement is given back to the queue. */
  stopping: AbortSignal;
}

/** The job that computes one entry to many digits and stores the revision, or why there is none. */
export function refineOrbitJob(tools: RefineTools): Task {
  return async (payload, { job }) => {
    const refinement = await beginRefinement(tools.db, (payload as { refinement: string }).refinement);
    if (!refinement) return;
    try {
      await finishRefinement(tools.db, refinement, await compute(tools, refinement));
    } catch (error) {
      if (tools.stopping.aborted) return giveBackRefinement(tools.db, refinement);
      tools.log.error({ err: error, refinement: refinement.id, attempt: job.attempts }, 'a refinement broke off');
      if (job.attempts < TRIES) throw error;
      const failure = `The computation broke off on our side, ${TRIES} times: ${messageOf(error)}`;
      await failRefinement(refinement, failure);
    }
  };
}

async function compute({ db, refiner, stopping }: RefineTools, refinement: Refinement): Promise<RefineOutcome> {
  const task = await refineTask(db, refinement);
  const startedAt = Date.now();
  try {
    return await refiner.refine(task, stopping);
  } catch (error) {
    if (stopping.aborted || !isThreadLimit(error)) throw error;
    const message = `The computation took more time or memory than its ${task.seconds} s allow and was ended.`;
    return { result: { ok: false, reason: 'too-long', message }, computeMs: Date.now() - startedAt };
  }
}
