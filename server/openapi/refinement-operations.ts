import { idempotencyKey, type Operation, pathParameter } from '@/server/openapi/operation';

const ACCESSION = pathParameter('accession', 'Accession such as RTN-00000175.');
const UNKNOWN = ['unknown-accession', 'wrong-check-character'] as const;

/** Entries computed to many digits. */
export const refinementOperations: readonly Operation[] = [
  {
    id: 'refineOrbit',
    method: 'post',
    path: '/orbits/:accession/refinements',
    summary: 'Compute an entry to many digits',
    description:
      'Every accepted entry is refined to 30 digits by itself; this asks for more, up to 100. Poll Location until state ' +
      'is done: then the entry has a new revision, or obstacle says why not. It counts as computing of the account.',
    role: 'reader',
    parameters: [ACCESSION, idempotencyKey],
    body: 'refinement-request',
    answers: [
      { status: 200, description: 'The entry has these digits already.', schema: 'refinement' },
      { status: 202, description: 'It waits or runs.', schema: 'refinement' },
    ],
    problems: [
      ...UNKNOWN,
      ...(['malformed-json', 'empty-body', 'invalid-body', 'body-too-large', 'unsupported-media-type'] as const),
      ...(['entry-withdrawn', 'too-many-checks', 'computing-time-used'] as const),
      ...(['idempotency-key-reused', 'request-in-progress'] as const),
    ],
  },
  {
    id: 'listRefinements',
    method: 'get',
    path: '/orbits/:accession/refinements',
    summary: 'What was tried to compute an entry to many digits',
    parameters: [ACCESSION],
    answers: [{ status: 200, description: 'The newest twenty, the newest first.', itemsOf: 'refinement' }],
    problems: UNKNOWN,
  },
  {
    id: 'readRefinement',
    method: 'get',
    path: '/orbits/:accession/refinements/:id',
    summary: 'How a refinement gets on',
    parameters: [ACCESSION, pathParameter('id', 'Id of the refinement.')],
    answers: [{ status: 200, description: 'The refinement.', schema: 'refinement' }],
    problems: [...UNKNOWN, 'not-found'],
  },
];
