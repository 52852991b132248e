import {
  idempotencyKey,
  ifMatch,
  ifNoneMatch,
  type Operation,
  pageParameters,
  pathParameter,
  queryParameter,
} from '@/server/openapi/operation';

const ID = pathParameter('id', 'Id of the submission.');
const BODY = ['malformed-json', 'empty-body', 'invalid-body', 'body-too-large', 'unsupported-media-type'] as const;
const MEMBER = ['not-signed-in', 'session-expired', 'not-allowed', 'cross-site'] as const;
const VERSION = ['precondition-required', 'precondition-failed'] as const;
const CHANGED = [{ status: 200, description: 'The submission as it is now.', schema: 'submission' }] as const;

/** The life of a submission. */
export const submissionOperations: readonly Operation[] = [
  {
    id: 'createSubmission',
    method: 'post',
    path: '/submissions',
    summary: 'A new draft, sent at once with "send": true',
    role: 'contributor',
    parameters: [idempotencyKey],
    body: 'submission-create',
    answers: [{ status: 201, description: 'The submission.', schema: 'submission' }],
    problems: [
      ...BODY,
      ...MEMBER,
      'invalid-content',
      'unknown-system',
      'idempotency-key-reused',
      'request-in-progress',
    ],
  },
  {
    id: 'listSubmissions',
    method: 'get',
    path: '/submissions',
    summary: 'Mine; with queue=review those to review, with queue=returned those that a curator sent back',
    role: 'reader',
    parameters: [
      queryParameter('queue', 'For curators. review: the queue; returned: what waits for its contributor.', {
        enum: ['review', 'returned'],
      }),
      ...pageParameters,
    ],
    answers: [{ status: 200, description: 'A page of submissions.', schema: 'submission-page' }],
    problems: ['not-signed-in', 'session-expired', 'not-allowed', 'invalid-query'],
  },
  {
    id: 'readSubmission',
    method: 'get',
    path: '/submissions/:id',
    summary: 'One submission with its history',
    role: 'reader',
    parameters: [ID, ifNoneMatch],
    answers: [{ status: 200, description: 'The submission, to its owner and to curators.', schema: 'submission' }],
    problems: ['not-signed-in', 'session-expired', 'not-found'],
  },
  {
    id: 'changeSubmission',
    method: 'patch',
    path: '/submissions/:id',
    summary: 'Replace the body of a draft or a returned submission',
    role: 'contributor',
    parameters: [ID, ifMatch],
    body: 'submission-change',
    answers: CHANGED,
    problems: [...BODY, ...MEMBER, ...VERSION, 'not-found', 'wrong-state'],
  },
  ...act('send', 'Send it: starts the check of this revision', {
    problems: ['invalid-content', 'unknown-system', 'wrong-state'],
  }),
  ...act('claim', 'Claim it for half an hour', {
    role: 'curator',
    body: 'claim-request',
    problems: ['claimed-by-another', 'wrong-state'],
  }),
  {
    ...act('claim', 'Give up the claim', { role: 'curator', problems: ['claimed-by-another', 'wrong-state'] })[0]!,
    id: 'releaseSubmission',
    method: 'delete',
  },
  ...act('decision', 'Accept, return or decline it', {
    role: 'curator',
    body: 'decision',
    version: true,
    problems: [
      'own-submission',
      'claimed-by-another',
      'already-decided',
      'stale-check',
      'check-missing',
      'blocked-by-finding',
      'already-known',
      'invalid-content',
      'wrong-state',
    ],
  }),
  ...act('withdraw', 'Withdraw it', { body: 'withdrawal-request', problems: ['wrong-state'] }),
  ...act('recheck', 'Check this revision again', { problems: ['wrong-state'] }),
  ...act('comments', 'Comment on it', { body: 'comment-request', problems: [] }),
];

interface Act {
  role?: Operation['role'];
  body?: string;
  version?: boolean;
  problems: Operation['problems'];
}

function act(verb: string, summary: string, { role = 'contributor', body, version, problems }: Act): Operation[] {
  return [
    {
      id: `${verb}Submission`,
      method: 'post',
      path: `/submissions/:id/${verb}`,
      summary,
      role,
      parameters: version ? [ID, ifMatch] : [ID],
      ...(body ? { body } : {}),
      answers: CHANGED,
      problems: [...(body ? BODY : []), ...MEMBER, ...(version ? VERSION : []), 'not-found', ...problems],
    },
  ];
}
