import { type Request, Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { userOf } from '@/server/http/current-user';
import { decodeCursor, encodeCursor } from '@/server/http/cursor';
import { linkNext } from '@/server/http/page-link';
import { readInclude } from '@/server/http/read-include';
import { readPage } from '@/server/http/read-page';
import { ExportGate, streamExport } from '@/server/http/stream-export';
import { dataPackage } from '@/server/presenters/data-package';
import { entryTable } from '@/server/presenters/entry-csv';
import { exportFormats } from '@/server/presenters/export-formats';
import { presentOrbitPage } from '@/server/presenters/orbit-page';
import { exportOrbits, type ExportShape } from '@/server/services/export-orbits';
import { STATEMENT_MS } from '@/server/services/read-only';
import { searchOrbits } from '@/server/services/search-orbits';
import { orbitOrders } from '@/server/search/orbit-orders';
import { readSearch } from '@/server/search/read-search';

/** The catalogue: pages of a search, and the whole of one as a file. */
export function orbitRoutes({ pool, config }: AppDependencies): Router {
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

  router.get('/orbits.datapackage.json', async (req, res) => {
    const search = readSearch(req.query);
    const { search: query } = new URL(req.originalUrl, config.publicUrl);
    await exportOrbits(pool, search, {
      statementMs: statementMs(req),
      write: ({ shape }) => {
        res.set('Cache-Control', 'no-store').json(searchPackage(config.publicUrl, query, shape));
        return Promise.resolve();
      },
    });
  });

  return router;
}

/** The descriptor that stands beside an export: where the files of this very search are, and the columns of the table. */
const searchPackage = (publicUrl: string, query: string, shape: ExportShape): object =>
  dataPackage({
    name: 'ritornel-orbits',
    title: 'Periodic orbits of Ritornel, the result of a search',
    homepage: `${publicUrl}/${query}`,
    created: new Date(),
    files: (['csv', 'ndjson', 'json'] as const).map((format) => ({
      name: `orbits.${format}`,
      path: `${publicUrl}/api/v1/orbits.${format}${query}`,
      mediaType: exportFormats[format].type.split(';')[0]!,
      ...(format === 'csv' && { fields: entryTable(shape).fields }),
    })),
  });

const statementMs = (req: Request): number => (userOf(req) ? STATEMENT_MS.signedIn : STATEMENT_MS.anonymous);
