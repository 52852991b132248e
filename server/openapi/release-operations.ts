import { idempotencyKey, type Operation, pathParameter } from '@/server/openapi/operation';

const ID = pathParameter('id', 'Number of the release.');

/** Dated copies of the whole catalogue. */
export const releaseOperations: readonly Operation[] = [
  {
    id: 'listReleases',
    method: 'get',
    path: '/releases',
    summary: 'All releases',
    answers: [{ status: 200, description: 'The newest first.', schema: 'release-list' }],
    problems: [],
  },
  {
    id: 'cutRelease',
    method: 'post',
    path: '/releases',
    summary: 'Cut a release of the whole catalogue',
    description: 'Every accepted entry as it is at that moment. Poll Location until state is ready.',
    role: 'curator',
    parameters: [idempotencyKey],
    body: 'release-request',
    answers: [{ status: 202, description: 'It is being cut.', schema: 'release' }],
    problems: [
      ...(['malformed-json', 'empty-body', 'invalid-body', 'body-too-large', 'unsupported-media-type'] as const),
      ...(['release-in-work', 'idempotency-key-reused', 'request-in-progress'] as const),
    ],
  },
  {
    id: 'readRelease',
    method: 'get',
    path: '/releases/:id',
    summary: 'One release',
    parameters: [ID],
    answers: [{ status: 200, description: 'The release with its files and their SHA-256.', schema: 'release' }],
    problems: ['not-found'],
  },
  {
    id: 'readReleaseFile',
    method: 'get',
    path: '/releases/:id/files/:name',
    summary: 'One file of a release',
    description: 'Byte for byte as it was cut. `datapackage.json` describes the others.',
    parameters: [ID, pathParameter('name', 'Name of the file.')],
    answers: [
      {
        status: 200,
        description: 'The file.',
        media: ['application/gzip', 'text/csv', 'application/json'],
      },
    ],
    problems: ['not-found'],
  },
];
