import { Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { notFound } from '@/server/errors';
import { answerWithEtag, strongEtag } from '@/server/http/conditional';
import { presentSystem } from '@/server/presenters/system';
import { listSystems } from '@/server/services/list-systems';

const SLUG = /^[a-z][a-z0-9-]{0,39}$/;

/** Systems, with what the catalogue holds of each. */
export function systemRoutes({ pool }: AppDependencies): Router {
  const router = Router();

  router.get('/systems', async (req, res) => {
    const body = { items: (await listSystems(pool)).map(presentSystem) };
    answerWithEtag(req, res, { etag: strongEtag(JSON.stringify(body)), body });
  });

  router.get('/systems/:slug', async (req, res) => {
    const slug = req.params['slug'];
    const [system] = SLUG.test(slug) ? await listSystems(pool, slug) : [];
    if (!system) throw notFound('system');
    const body = presentSystem(system);
    answerWithEtag(req, res, { etag: strongEtag(JSON.stringify(body)), body });
  });

  return router;
}
