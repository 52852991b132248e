import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router } from 'express';
import { schemaDocuments } from '@/server/schema-registry';

/** One year, in seconds: names below `_expo` and `assets` carry a hash of their content. */
const IMMUTABLE = 'public, max-age=31536000, immutable';
/** Fonts keep their names for good; a month lets a mended one through. */
const MONTH = 'public, max-age=2592000';
/** The subset fonts with their licences, served as they are. */
const FONTS = join(__dirname, '..', '..', 'assets', 'fonts');
/** Everything else is asked for again each time and answered 304. */
const REVALIDATE = 'no-cache';

/** The web client: its files, and its one page for every other address that wants HTML. */
export function serveWeb(folder: string): Router {
  const router = Router();
  const page = join(folder, 'index.html');
  router.use(
    '/fonts',
    express.static(FONTS, {
      index: false,
      redirect: false,
      setHeaders: (res) => {
        res.setHeader('Cache-Control', MONTH);
      },
    }),
  );
  router.use(
    express.static(folder, {
      index: false,
      redirect: false,
      setHeaders: (res, file) => {
        const hashed = file.startsWith(join(folder, '_expo')) || file.startsWith(join(folder, 'assets'));
        res.setHeader('Cache-Control', hashed ? IMMUTABLE : REVALIDATE);
      },
    }),
  );
  router.get('/{*path}', (req, res, next) => {
    if (isFile(req.path) || !req.accepts('html') || !existsSync(page)) next();
    else res.set('Cache-Control', REVALIDATE).sendFile('index.html', { root: folder });
  });
  return router;
}

/** Addresses of files and of the API never answer with the page: a missing script must not be read as HTML. */
const isFile = (path: string): boolean =>
  /^\/(?:api|_expo|assets|fonts|schemas)(?:\/|$)/.test(path) || /\.[a-z0-9]{1,5}$/i.test(path);

/** The contract's schemas, as files. */
export function serveSchemas(): Router {
  const router = Router();
  router.get('/schemas/:name.schema.json', (req, res, next) => {
    const document = schemaDocuments.get(req.params.name);
    if (!document) {
      next();
      return;
    }
    res
      .set('Cache-Control', 'public, max-age=300')
      .type('application/schema+json')
      .send(JSON.stringify(document, null, 2));
  });
  return router;
}
