import type { MessagePort } from 'node:worker_threads';
import type { CheckReport, CheckRequest, SystemDocument, Trace } from '@/schemas/generated/contract';
import { type CheckProgress } from '@/server/checks/check-progress';
import { checkOrbit } from '@/server/checks/check-orbit';
import type { CatalogueOrbit } from '@/server/checks/match-orbits';
import { refineOrbit } from '@/server/checks/refine-orbit';
import { traceOrbit } from '@/server/checks/trace-orbit';
import { checkSystem } from '@/server/formulas/check-system';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import type { RefineOutcome, RefineTask } from '@/server/services/refiner';
import type { TraceRequest } from '@/server/services/tracer';
import { afterComputing, threadMs, yieldToOthers } from '@/server/thread-time';

/** One check for a thread of the pool. */
export interface CheckTask {
  document: SystemDocument;
  body: CheckRequest;
  isSubmission: boolean;
  catalogue: CatalogueOrbit[];
  /** Computing time after which the check ends itself with what it has. */
  seconds: number;
  /** Where progress is told; transferred. */
  progress: MessagePort;
}

/** Progress is told at most twice a second. */
const PROGRESS_EVERY_MS = 500;

/** Check one orbit. */
export function check({ document, body, isSubmission, catalogue, seconds, progress }: CheckTask): CheckReport {
  let toldAt = 0;
  try {
    return checkOrbit({
      system: parsed(document),
      claim: body,
      isSubmission,
      catalogue,
      shouldStop: after(seconds),
      onProgress: (news: CheckProgress) => {
        if (Date.now() - toldAt < PROGRESS_EVERY_MS) return;
        toldAt = Date.now();
        progress.postMessage(news);
      },
    });
  } finally {
    progress.close();
  }
}

/** Draw one orbit. */
export function trace({ document, points, ...orbit }: TraceRequest): Trace {
  const drawn = traceOrbit(parsed(document), orbit, points);
  if (drawn === null) throw new RangeError('the orbit cannot be read');
  return drawn;
}

/** Compute one orbit to many digits, when nothing else has a use for the processor. */
export function refine({ document, seconds, ...task }: RefineTask): RefineOutcome {
  yieldToOthers();
  const begun = threadMs();
  const result = refineOrbit({ ...task, system: parsed(document), shouldStop: afterComputing(seconds) });
  return { result, computeMs: threadMs() - begun };
}

function parsed(document: SystemDocument): CheckedSystem {
  const checked = checkSystem(document);
  if (!checked.ok) throw new RangeError(`the system does not parse: ${checked.errors[0]?.message ?? ''}`);
  return checked.system;
}

function after(seconds: number): () => boolean {
  const end = Date.now() + seconds * 1000;
  return () => Date.now() >= end;
}
