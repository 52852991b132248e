import {
  headerParameter,
  idempotencyKey,
  type Operation,
  pathParameter,
  queryParameter,
} from '@/server/openapi/operation';

const ID = pathParameter('id', 'Id of the check.');
const BODY = ['malformed-json', 'empty-body', 'invalid-body', 'body-too-large', 'unsupported-media-type'] as const;

/** Checks: anyone may ask for one. */
export const checkOperations: readonly Operation[] = [
  {
    id: 'checkOrbit',
    method: 'post',
    path: '/checks',
    summary: 'Check an orbit without submitting it',
    description: 'The system is a slug or a whole document. Both answers carry Location.',
    parameters: [
      idempotencyKey,
      headerParameter('Prefer', 'wait=20 waits up to so many seconds (60 at most) for the report.'),
    ],
    body: 'check-request',
    answers: [
      { status: 200, description: 'The report is ready.', schema: 'check' },
      { status: 202, description: 'The check waits or runs.', schema: 'check' },
    ],
    problems: [
      ...BODY,
      'invalid-content',
      'unknown-system',
      'too-many-checks',
      'computing-time-used',
      'idempotency-key-reused',
      'request-in-progress',
    ],
  },
  {
    id: 'readCheck',
    method: 'get',
    path: '/checks/:id',
    summary: 'A check and, once done, its report',
    parameters: [ID],
    answers: [{ status: 200, description: 'The check.', schema: 'check' }],
    problems: ['not-found'],
  },
  {
    id: 'followCheck',
    method: 'get',
    path: '/checks/:id/events',
    summary: 'Progress of a check as server-sent events',
    parameters: [ID],
    answers: [{ status: 200, description: 'Events until the check is done.', media: ['text/event-stream'] }],
    problems: ['not-found', 'too-many-requests'],
  },
  {
    id: 'traceCheck',
    method: 'get',
    path: '/checks/:id/trace',
    summary: 'The polyline to draw',
    parameters: [
      ID,
      queryParameter('points', 'Points of the polyline.', { type: 'integer', minimum: 2, maximum: 5000, default: 600 }),
    ],
    answers: [{ status: 200, description: 'Times, points and crossings.', schema: 'trace' }],
    problems: ['not-found', 'invalid-query'],
  },
];
