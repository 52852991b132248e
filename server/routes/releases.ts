import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { type Request, Router } from 'express';
import type { ReleaseRequest } from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { notFound } from '@/server/errors';
import { idempotent } from '@/server/http/idempotency';
import { requireRole, signedInUser } from '@/server/http/require-role';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { presentRelease } from '@/server/presenters/release';
import { listReleases } from '@/server/services/list-releases';
import { findReleaseFile, readReleaseFile } from '@/server/services/release-files';
import { requestRelease } from '@/server/services/request-release';

/** A file of a release never changes. */
const FOR_EVER = 'public, max-age=31536000, immutable';

/** Dated copies of the whole catalogue. */
export function releaseRoutes({ db, pool, config: { publicUrl } }: AppDependencies): Router {
  const router = Router();

  router.get('/releases', async (_req, res) => {
    const items = await listReleases(pool);
    res.set('Cache-Control', 'no-cache').json({ items: items.map((row) => presentRelease(row, publicUrl)) });
  });

  router.post('/releases', requireRole('curator'), validBody('release-request'), idempotent(db), async (req, res) => {
    const { note = '' } = bodyOf<ReleaseRequest>(req);
    const id = await requestRelease(db, { curatorId: signedInUser(req).id, note: note.trim() });
    const [row] = await listReleases(pool, id);
    const release = presentRelease(row!, publicUrl);
    res.status(202).location(release.links.self).json(release);
  });

  router.get('/releases/:id', async (req, res) => {
    const [row] = await listReleases(pool, releaseNumber(req));
    if (!row) throw notFound('release');
    res.set('Cache-Control', 'no-cache').json(presentRelease(row, publicUrl));
  });

  router.get('/releases/:id/files/:name', async (req, res) => {
    const id = releaseNumber(req);
    const file = await findReleaseFile(pool, id, req.params.name);
    if (!file) throw notFound('file of a release');
    res.set({ 'Cache-Control': FOR_EVER, ETag: `"${file.sha256}"` });
    if (req.headers['if-none-match']?.includes(file.sha256)) {
      res.status(304).end();
      return;
    }
    res.set({
      // What is compressed already is sent as the file that its hash was taken of.
      'Content-Type': file.name.endsWith('.gz') ? 'application/gzip' : `${file.mediaType}; charset=utf-8`,
      'Content-Length': String(file.bytes),
      'Content-Disposition': `attachment; filename="ritornel-release-${id}-${file.name}"`,
      'Cache-Control': `${FOR_EVER}, no-transform`,
    });
    try {
      await pipeline(Readable.from(readReleaseFile(pool, id, file.name), { objectMode: false }), res);
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
    }
  });

  return router;
}

/** The number in an address; what can be no number is no release. */
function releaseNumber(req: Request): number {
  const typed = String(req.params['id']);
  if (!/^[1-9]\d{0,8}$/.test(typed)) throw notFound('release');
  return parseInt(typed, 10);
}
