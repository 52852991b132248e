import { type Request, type Response, Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { Problem } from '@/server/errors';
import { answerWithEtag, strongEtag } from '@/server/http/conditional';
import { readPoints } from '@/server/http/read-points';
import { readRevision } from '@/server/http/read-revision';
import { presentEntry } from '@/server/presenters/entry';
import { entryFileLinks } from '@/server/presenters/head/entry-head';
import { linkHeader } from '@/server/presenters/head/page-head';
import { entryForms } from '@/server/presenters/entry-forms';
import { type EntryRow } from '@/server/services/entry-rows';
import { findEntry } from '@/server/services/find-entry';
import { findTraceRequest } from '@/server/services/find-trace-request';
import { listImages } from '@/server/services/list-images';
import { listRevisions } from '@/server/services/list-revisions';

const JSON_FORM = 'application/json';
const PAGE_FORM = 'text/html';
const FORMS = [JSON_FORM, ...entryForms.map(({ media }) => media), PAGE_FORM];

/** One entry, its picture and its history. */
export function entryRoutes({ pool, tracer, config }: AppDependencies): Router {
  const router = Router();

  router.get('/orbits/:accession', async (req, res) => {
    const [typed, suffix] = splitSuffix(req.params['accession']);
    const entry = await findEntry(pool, typed, readRevision(req.query));
    sendEntry(req, res, { entry, form: suffix ?? acceptedForm(req), publicUrl: config.publicUrl });
  });

  router.get('/orbits/:accession/trace', async (req, res) => {
    const points = readPoints(req.query);
    const request = await findTraceRequest(pool, { accession: req.params['accession'], points });
    const trace = await tracer.trace(request);
    // A revision never changes; the engine that draws it may.
    res.set('Cache-Control', 'public, max-age=3600').json(trace);
  });

  router.get('/orbits/:accession/revisions', async (req, res) => {
    const entry = await findEntry(pool, req.params['accession']);
    res.set('Cache-Control', 'no-cache').json({ items: await listRevisions(pool, entry) });
  });

  router.get('/orbits/:accession/images', async (req, res) => {
    const entry = await findEntry(pool, req.params['accession']);
    res.set('Cache-Control', 'no-cache').json({ items: await listImages(pool, entry.number) });
  });

  return router;
}

/** `RTN-00000175.csv` asks for CSV, whatever the headers say. */
function splitSuffix(address: string): [typed: string, form: string | null] {
  const lower = address.toLowerCase();
  const form = entryForms.find(({ suffix }) => lower.endsWith(`.${suffix}`));
  if (form) return [address.slice(0, -form.suffix.length - 1), form.media];
  return lower.endsWith('.json') ? [address.slice(0, -'.json'.length), JSON_FORM] : [address, null];
}

function acceptedForm(req: Request): string {
  const form = req.accepts(FORMS);
  if (form) return form;
  throw new Problem('not-acceptable', `An entry is available as ${FORMS.join(', ')}.`);
}

interface Sent {
  entry: EntryRow;
  form: string;
  publicUrl: string;
}

function sendEntry(req: Request, res: Response, { entry, form, publicUrl }: Sent): void {
  res.vary('Accept').set('Link', linkHeader(entryFileLinks(entry, publicUrl)));
  const file = entryForms.find(({ media }) => media === form);
  if (file) {
    res
      .set('Content-Disposition', `attachment; filename="${entry.accession}.${file.suffix}"`)
      .type(file.type)
      .send(file.render(entry, publicUrl));
    return;
  }
  const shown = presentEntry(entry);
  if (form === PAGE_FORM) res.redirect(303, shown.links.page);
  else answerWithEtag(req, res, { etag: strongEtag(JSON.stringify(shown)), body: shown });
}
