import { type Request, Router } from 'express';
import type {
  ClaimRequest,
  CommentRequest,
  Decision,
  DraftBody,
  SubmissionCreate,
  SubmissionPage,
  WithdrawalRequest,
} from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { invalidBody, invalidQuery } from '@/server/errors';
import { decodeCursor, encodeCursor } from '@/server/http/cursor';
import { formErrors } from '@/server/http/form-errors';
import { idParameter } from '@/server/http/id-parameter';
import { idempotent } from '@/server/http/idempotency';
import { linkNext } from '@/server/http/page-link';
import { readPage } from '@/server/http/read-page';
import { hasRole, requireRole, requireSignedIn, signedInUser } from '@/server/http/require-role';
import { answerSubmission, seenVersion } from '@/server/http/submission-version';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { notAllowed } from '@/server/errors';
import { presentSubmissionSummary } from '@/server/presenters/submission';
import { changeSubmission } from '@/server/services/change-submission';
import { claimSubmission, releaseSubmission } from '@/server/services/claim-submission';
import { commentSubmission } from '@/server/services/comment-submission';
import { createSubmission } from '@/server/services/create-submission';
import { decideSubmission } from '@/server/services/decide-submission';
import { findSubmission } from '@/server/services/find-submission';
import { listSubmissions, type SubmissionPlace, type SubmissionQueue } from '@/server/services/list-submissions';
import { recheckSubmission } from '@/server/services/recheck-submission';
import { sendSubmission, type SendRules } from '@/server/services/send-submission';
import { withdrawSubmission } from '@/server/services/withdraw-submission';

const sendRules: SendRules = { formErrors: (body) => formErrors('submission-body', body) };

/** The life of a submission. Services test who may do what; strangers get 404. */
export function submissionRoutes(dependencies: AppDependencies): Router {
  const router = Router();
  router.use(submissionReading(dependencies), submissionWriting(dependencies), submissionReview(dependencies));
  return router;
}

const idOf = (req: Request): string => idParameter(req, 'submission');

function submissionReading({ db }: AppDependencies): Router {
  const router = Router();

  router.get('/submissions', requireSignedIn, async (req, res) => {
    const person = signedInUser(req);
    const { limit, after } = readPage(req.query, ['queue']);
    const queue = readQueue(req.query['queue']);
    if (queue !== 'mine' && !hasRole(person, 'curator')) throw notAllowed('curator');
    const cursor = ['submissions', queue];
    const place = after === null ? null : (decodeCursor(cursor, after, 2) as SubmissionPlace);
    const { items, last, total, turns } = await listSubmissions(db, person, { queue, limit, after: place });
    const next = last && encodeCursor(cursor, last);
    const page: SubmissionPage = {
      items: items.map((row) => presentSubmissionSummary(row, person.id)),
      next,
      total: { value: total, relation: 'exact' },
      turns,
    };
    linkNext(req, res, next);
    res.set('Cache-Control', 'no-store').json(page);
  });

  router.get('/submissions/:id', requireSignedIn, async (req, res) => {
    answerSubmission(req, res, await findSubmission(db, idOf(req), signedInUser(req)));
  });

  return router;
}

function submissionWriting({ config, db }: AppDependencies): Router {
  const router = Router();
  const desk = { db, publicUrl: config.publicUrl };
  const contributor = requireRole('contributor');

  router.post('/submissions', contributor, validBody('submission-create'), idempotent(db), async (req, res) => {
    const { send, ...body } = bodyOf<SubmissionCreate>(req);
    const errors = send ? sendRules.formErrors(body) : [];
    if (errors.length > 0) throw invalidBody(errors);
    const person = signedInUser(req);
    const id = await createSubmission(desk, person, { body, send: send ? sendRules : null });
    res.status(201).location(`/api/v1/submissions/${id}`);
    answerSubmission(req, res, await findSubmission(db, id, person));
  });

  router.patch('/submissions/:id', contributor, validBody('submission-change'), async (req, res) => {
    const person = signedInUser(req);
    const body = bodyOf<DraftBody>(req);
    await changeSubmission(desk, person, { id: idOf(req), seen: seenVersion(req), body });
    answerSubmission(req, res, await findSubmission(db, idOf(req), person));
  });

  router.post('/submissions/:id/send', contributor, async (req, res) => {
    const person = signedInUser(req);
    await sendSubmission(desk, person, { id: idOf(req), seen: seenVersion(req), rules: sendRules });
    answerSubmission(req, res, await findSubmission(db, idOf(req), person));
  });

  router.post('/submissions/:id/withdraw', contributor, validBody('withdrawal-request'), async (req, res) => {
    const person = signedInUser(req);
    const { comment = null } = bodyOf<WithdrawalRequest>(req);
    await withdrawSubmission(desk, person, { id: idOf(req), comment });
    answerSubmission(req, res, await findSubmission(db, idOf(req), person));
  });

  return router;
}

function submissionReview({ config, db, tracer }: AppDependencies): Router {
  const router = Router();
  const desk = { db, publicUrl: config.publicUrl, tracer };
  const contributor = requireRole('contributor');

  router.post('/submissions/:id/claim', contributor, validBody('claim-request'), async (req, res) => {
    const person = signedInUser(req);
    const { takeOver = false } = bodyOf<ClaimRequest>(req);
    await claimSubmission(desk, person, { id: idOf(req), takeOver });
    answerSubmission(req, res, await findSubmission(db, idOf(req), person));
  });

  router.delete('/submissions/:id/claim', contributor, async (req, res) => {
    const person = signedInUser(req);
    await releaseSubmission(desk, person, idOf(req));
    answerSubmission(req, res, await findSubmission(db, idOf(req), person));
  });

  router.post('/submissions/:id/decision', contributor, validBody('decision'), async (req, res) => {
    const person = signedInUser(req);
    const decision = bodyOf<Decision>(req);
    await decideSubmission(desk, person, { id: idOf(req), seen: seenVersion(req), decision });
    answerSubmission(req, res, await findSubmission(db, idOf(req), person));
  });

  router.post('/submissions/:id/recheck', contributor, async (req, res) => {
    const person = signedInUser(req);
    await recheckSubmission(desk, person, idOf(req));
    answerSubmission(req, res, await findSubmission(db, idOf(req), person));
  });

  router.post(
    '/submissions/:id/comments',
    contributor,
    validBody('comment-request'),
    idempotent(db),
    async (req, res) => {
      const person = signedInUser(req);
      await commentSubmission(desk, person, { id: idOf(req), text: bodyOf<CommentRequest>(req).text });
      answerSubmission(req, res, await findSubmission(db, idOf(req), person));
    },
  );

  return router;
}

function readQueue(given: unknown): SubmissionQueue {
  if (given === undefined || given === '') return 'mine';
  if (given === 'review' || given === 'returned') return given;
  throw invalidQuery([
    { pointer: '#queue', message: 'queue is "review" or "returned", or left out for your own submissions.' },
  ]);
}
