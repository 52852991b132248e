import { type Request, type Response, Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { Problem } from '@/server/errors';
import { answerWithEtag, strongEtag } from '@/server/http/conditional';
import { readPoints } from '@/server/http/read-points';
import { presentEntry } from '@/server/presenters/entry';
import { entryTable } from '@/server/presenters/entry-csv';
import { type EntryRow } from '@/server/services/entry-rows';
import { findEntry } from '@/server/services/find-entry';
import { findTraceRequest } from '@/server/services/find-trace-request';
import { listRevisions } from '@/server/services/list-revisions';

const FORMS = ['application/json', 'text/csv', 'text/html'] as const;
type Form = (typeof FORMS)[number];

/** One entry, its picture and its history. */
export function entryRoutes({ pool, tracer }: AppDependencies): Router {
  const router = Router();

  router.get('/orbits/:accession', async (req, res) => {
    const [typed, suffix] = splitSuffix(req.params['accession']);
    const entry = await findEntry(pool, typed);
    sendEntry(req, res, { entry, form: suffix ?? acceptedForm(req) });
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
    res.set('Cache-Control', 'no-cache').json({ items: await listRevisions(pool, entry.number) });
  });

  return router;
}

/** `RTN-00000175.csv` asks for CSV, whatever the headers say. */
function splitSuffix(address: string): [typed: string, form: Form | null] {
  const [, typed, suffix] = /^(.*)\.(csv|json)$/i.exec(address) ?? [];
  if (typed === undefined) return [address, null];
  return [typed, suffix?.toLowerCase() === 'csv' ? 'text/csv' : 'application/json'];
}

function acceptedForm(req: Request): Form {
  const form = req.accepts([...FORMS]) as Form | false;
  if (form) return form;
  throw new Problem('not-acceptable', `An entry is available as ${FORMS.join(', ')}.`);
}

function sendEntry(req: Request, res: Response, { entry, form }: { entry: EntryRow; form: Form }): void {
  const shown = presentEntry(entry);
  res.vary('Accept');
  if (form === 'text/html') {
    res.redirect(302, shown.links.page);
    return;
  }
  if (form === 'application/json') {
    answerWithEtag(req, res, { etag: strongEtag(JSON.stringify(shown)), body: shown });
    return;
  }
  const table = entryTable({ dimension: shown.point.length, parameters: Object.keys(shown.parameters) });
  res
    .set('Content-Disposition', `attachment; filename="${shown.accession}.csv"`)
    .type('text/csv; charset=utf-8; header=present')
    .send(table.header + table.record(shown));
}
