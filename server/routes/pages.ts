import { existsSync } from 'node:fs';
import { readFile } from 'node:fs/promises';
import { join } from 'node:path';
import { type Request, type Response, Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { Problem } from '@/server/errors';
import { withHead } from '@/server/http/with-head';
import { archiveHead } from '@/server/presenters/head/archive-head';
import { entryHead } from '@/server/presenters/head/entry-head';
import { linkHeader, type PageHead } from '@/server/presenters/head/page-head';
import { systemHead } from '@/server/presenters/head/system-head';
import { findEntry } from '@/server/services/find-entry';
import { listSystems } from '@/server/services/list-systems';

/**
 * Pages that programs read too: the client's document with what the page is about in its head and in `Link`. Where there
 * is nothing under an address the client says so on the page, and the status says it as well.
 *
 * @param folder where the built client lies.
 */
export function pageRoutes({ pool, config: { publicUrl } }: AppDependencies, folder: string): Router {
  const router = Router();
  const document = join(folder, 'index.html');
  router.use((req, _res, next) => next(req.method === 'GET' && existsSync(document) ? undefined : 'router'));

  const sendPage = async (req: Request, res: Response, head: PageHead | null): Promise<void> => {
    const text = await readFile(document, 'utf8');
    res.set('Cache-Control', 'no-cache').type('html');
    if (head === null) {
      res.status(404).set('X-Robots-Tag', 'noindex').send(text);
      return;
    }
    // A search is not a page of its own, and there are endlessly many.
    if (Object.keys(req.query).length > 0) res.set('X-Robots-Tag', 'noindex, follow');
    res.set('Link', linkHeader(head.links)).send(withHead(text, head));
  };

  router.get('/', (req, res) => sendPage(req, res, archiveHead(publicUrl)));

  router.get('/orbits/:accession', async (req, res) => {
    const entry = await findEntry(pool, req.params.accession).catch(nothingThere);
    await sendPage(req, res, entry && entryHead(entry, publicUrl));
  });

  router.get('/systems/:slug', async (req, res) => {
    const [system] = await listSystems(pool, req.params.slug);
    await sendPage(req, res, system ? systemHead(system, publicUrl) : null);
  });

  return router;
}

/** An address without an entry is an answer of this page, not a failure. */
function nothingThere(error: unknown): null {
  if (error instanceof Problem && error.status === 404) return null;
  throw error;
}
