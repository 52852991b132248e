import { type Request, Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { userOf } from '@/server/http/current-user';
import { decodeCursor, encodeCursor } from '@/server/http/cursor';
import { linkNext } from '@/server/http/page-link';
import { readInclude } from '@/server/http/read-include';
import { readPage } from '@/server/http/read-page';
import { ExportGate, streamExport } from '@/server/http/stream-export';
import { presentOrbitPage } from '@/server/presenters/orbit-page';
import { exportOrbits } from '@/server/services/export-orbits';
import { STATEMENT_MS } from '@/server/services/read-only';
import { searchOrbits } from '@/server/services/search-orbits';
import { orbitOrders } from '@/server/search/orbit-orders';
import { readSearch } from '@/server/search/read-search';

/** The catalogue: pages of a search, and the whole of one as a file. */
export function orbitRoutes({ pool }: AppDependencies): Router {
  const router = Router();

  router.get('/orbits', async (req, res) => {
    const { limit, after, include, ...asked } = req.query;
    const search = readSearch(asked);
    const page = readPage({ ...(limit !== undefined && { limit }), ...(after !== undefined && { after }) });
    const withIncipits = readInclude(include);
    const columns = orbitOrders[search.sort].columns.length;
    const place = page.after === null ? null : decodeCursor(search, page.after, columns);

    const found = await searchOrbits(pool, search, { limit: page.limit, after: place, statementMs: statementMs(req) });
    const next = found.last && encodeCursor(search, found.last);
    linkNext(req, res, next);
    res
      .set('Cache-Control', 'no-cache')
      .json(presentOrbitPage(found, { next, withIncipits, withDistances: search.near !== null }));
  });

  const gate = new ExportGate();
  for (const format of ['json', 'ndjson', 'csv'] as const) {
    router.get(`/orbits.${format}`, async (req, res) => {
      const search = readSearch(req.query);
      await gate.pass(() =>
        exportOrbits(pool, search, {
          statementMs: statementMs(req),
          write: (found) => streamExport(res, found, { format, system: search.system }),
        }),
      );
    });
  }

  return router;
}

const statementMs = (req: Request): number => (userOf(req) ? STATEMENT_MS.signedIn : STATEMENT_MS.anonymous);
