import { timingSafeEqual } from 'node:crypto';
import { type Request, Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { notFound, Problem } from '@/server/errors';
import type { RequestCounts } from '@/server/http/request-counts';
import { metricsText } from '@/server/services/metrics-text';
import { readiness } from '@/server/services/readiness';

const LOOPBACK = new Set(['127.0.0.1', '::1', '::ffff:127.0.0.1']);

/** For those who operate the server. */
export function healthRoutes({ config, db }: AppDependencies, requests: RequestCounts): Router {
  const router = Router();

  router.get('/healthz', (_req, res) => {
    res.set('Cache-Control', 'no-store').json({ status: 'ok' });
  });

  router.get('/readyz', async (_req, res) => {
    const missing = await readiness(db, config);
    if (missing.length > 0) throw new Problem('not-ready', `Not ready yet: ${missing.join(', ')}.`);
    res.set('Cache-Control', 'no-store').json({ status: 'ready' });
  });

  router.get('/metrics', async (req, res) => {
    if (!mayReadMetrics(req, config.metricsToken)) throw notFound('page');
    res
      .set('Cache-Control', 'no-store')
      .type('text/plain; version=0.0.4')
      .send(await metricsText(db, requests.byClass));
  });

  return router;
}

/** Whoever asks from this very machine, not through a proxy, or holds the token. */
function mayReadMetrics(req: Request, token: string | null): boolean {
  if (LOOPBACK.has(req.socket.remoteAddress ?? '') && req.headers['x-forwarded-for'] === undefined) return true;
  if (token === null) return false;
  const given = Buffer.from(req.headers.authorization ?? '');
  const right = Buffer.from(`Bearer ${token}`);
  return given.length === right.length && timingSafeEqual(given, right);
}
