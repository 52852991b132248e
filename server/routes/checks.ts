import { type Request, type Response, Router } from 'express';
import type { CheckRequest } from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { userOf } from '@/server/http/current-user';
import { type EventStream, EventStreams } from '@/server/http/event-stream';
import { idempotent } from '@/server/http/idempotency';
import { preferredWait } from '@/server/http/prefer-wait';
import { addressOf } from '@/server/http/rate-limits';
import { readPoints } from '@/server/http/read-points';
import { requesterOf } from '@/server/http/requester';
import { bodyOf, validBody } from '@/server/http/valid-body';
import type { OrbitCheck } from '@/server/models/orbit-check';
import { presentCheck, presentProgress } from '@/server/presenters/check';
import { Bell } from '@/server/services/bell';
import { findCheck, reportOf } from '@/server/services/find-check';
import { startCheck } from '@/server/services/start-check';
import { traceCheck } from '@/server/services/trace-check';
import { ASK_EVERY_MS, isOver, waitForCheck } from '@/server/services/wait-for-check';

/** Checks: anyone may ask for one. */
export function checkRoutes(dependencies: AppDependencies): Router {
  const { config, db, checks, tracer } = dependencies;
  const router = Router();
  const streams = new EventStreams();

  router.post('/checks', validBody('check-request'), idempotent(db), async (req, res) => {
    const requester = requesterOf(req, config.sessionSecret);
    const check = await startCheck(db, requester, bodyOf<CheckRequest>(req));
    res.location(`/api/v1/checks/${check.id}`);
    const seconds = preferredWait(req, res);
    if (seconds > 0) await waitForCheck(checks, check, { seconds, signal: goneSignal(res) });
    res.status(isOver(check) ? 200 : 202);
    await answerCheck(res, check);
  });

  router.get('/checks/:id', async (req, res) => {
    await answerCheck(res, await checkOf(req));
  });

  router.get('/checks/:id/events', async (req, res) => {
    const check = await checkOf(req);
    const over = new AbortController();
    const client = userOf(req)?.id ?? addressOf(req);
    const stream = streams.begin(req, res, { client, onEnd: () => over.abort() });
    await follow(dependencies, { check, stream, over: over.signal });
    stream.end();
  });

  router.get('/checks/:id/trace', async (req, res) => {
    const points = readPoints(req.query);
    const check = await checkOf(req);
    res.set('Cache-Control', 'private, max-age=3600').json(await traceCheck(db, tracer, check, points));
  });

  return router;
}

const checkOf = (req: Request): Promise<OrbitCheck> => findCheck(String(req.params['id']), userOf(req));

async function answerCheck(res: Response, check: OrbitCheck): Promise<void> {
  const report = check.state === 'done' ? await reportOf(check) : null;
  res.set('Cache-Control', 'no-store').json(presentCheck(check, report));
}

/** Aborted when the client has gone away. */
function goneSignal(res: Response): AbortSignal {
  const gone = new AbortController();
  res.once('close', () => gone.abort());
  return gone.signal;
}

interface Following {
  check: OrbitCheck;
  stream: EventStream;
  over: AbortSignal;
}

/** Tell a stream how a check gets on, until it is over or nobody listens. */
async function follow({ checks }: AppDependencies, { check, stream, over }: Following): Promise<void> {
  const bell = new Bell();
  const stop = checks.watch(check.id, () => bell.ring());
  try {
    for (let told = ''; !over.aborted;) {
      await check.reload();
      const now = presentProgress(check);
      if (told !== JSON.stringify(now)) stream.send(isOver(check) ? 'done' : 'progress', now);
      told = JSON.stringify(now);
      if (isOver(check)) return;
      await bell.wait(ASK_EVERY_MS, over);
    }
  } finally {
    stop();
  }
}
