import { entryForms } from '@/server/presenters/entry-forms';
import { ifNoneMatch, type Operation, pageParameters, pathParameter, queryParameter } from '@/server/openapi/operation';
import { exportParameters, searchParameters } from '@/server/openapi/search-parameters';

const ACCESSION = pathParameter('accession', 'Accession such as RTN-00000175.');
const UNKNOWN = ['unknown-accession', 'wrong-check-character'] as const;
const SLOW = ['invalid-query', 'search-too-slow'] as const;

/** Systems and the catalogue, as anyone reads them. */
export const orbitOperations: readonly Operation[] = [
  {
    id: 'listSystems',
    method: 'get',
    path: '/systems',
    summary: 'All accepted systems',
    parameters: [ifNoneMatch],
    answers: [{ status: 200, description: 'Systems by name, with their counts.', schema: 'system-list' }],
    problems: [],
  },
  {
    id: 'readSystem',
    method: 'get',
    path: '/systems/:slug',
    summary: 'One system',
    parameters: [pathParameter('slug', "The system's name in addresses."), ifNoneMatch],
    answers: [{ status: 200, description: 'The system with its document and counts.', schema: 'system' }],
    problems: ['not-found'],
  },
  {
    id: 'searchOrbits',
    method: 'get',
    path: '/orbits',
    summary: 'Search the catalogue',
    parameters: [...searchParameters, ...pageParameters],
    answers: [{ status: 200, description: 'A page of entries.', schema: 'orbit-page' }],
    problems: SLOW,
  },
  {
    id: 'exportOrbitsJson',
    method: 'get',
    path: '/orbits.json',
    summary: 'The whole result of a search as one JSON document',
    parameters: exportParameters,
    answers: [{ status: 200, description: 'Every entry of the search, streamed.', schema: 'entry-export' }],
    problems: SLOW,
  },
  {
    id: 'exportOrbitsNdjson',
    method: 'get',
    path: '/orbits.ndjson',
    summary: 'The whole result of a search, one entry a line',
    description: 'The last line holds the count and the SHA-256 of all bytes before it: a file without it was cut off.',
    parameters: exportParameters,
    answers: [{ status: 200, description: 'Every entry of the search, streamed.', media: ['application/x-ndjson'] }],
    problems: SLOW,
  },
  {
    id: 'exportOrbitsCsv',
    method: 'get',
    path: '/orbits.csv',
    summary: 'The whole result of a search as a table',
    parameters: exportParameters,
    answers: [{ status: 200, description: 'Every entry of the search, streamed (RFC 4180).', media: ['text/csv'] }],
    problems: SLOW,
  },
  {
    id: 'describeExport',
    method: 'get',
    path: '/orbits.datapackage.json',
    summary: "What an export's files and columns are",
    description: 'A Frictionless Data Package descriptor whose resources are the exports of the same search.',
    parameters: exportParameters,
    answers: [{ status: 200, description: 'The descriptor.', media: ['application/json'] }],
    problems: SLOW,
  },
  {
    id: 'readOrbit',
    method: 'get',
    path: '/orbits/:accession',
    summary: 'One entry',
    description:
      'JSON; by Accept or a suffix CSV (.csv), BibTeX (.bib), CSL-JSON (.csl.json), RIS (.ris) and a sentence to cite ' +
      '(.txt). A browser that asks for HTML is sent on to the page with 303.',
    parameters: [
      ACCESSION,
      queryParameter('revision', 'One of its revisions; the current one unless given.', {
        type: 'integer',
        minimum: 1,
      }),
      ifNoneMatch,
    ],
    answers: [
      {
        status: 200,
        description: 'The entry, withdrawn or not.',
        schema: 'entry',
        media: entryForms.map(({ media }) => media),
      },
    ],
    problems: [...UNKNOWN, 'not-found', 'invalid-query', 'not-acceptable'],
  },
  {
    id: 'traceOrbit',
    method: 'get',
    path: '/orbits/:accession/trace',
    summary: 'The polyline to draw',
    parameters: [
      ACCESSION,
      {
        name: 'points',
        in: 'query',
        description: 'Points of the polyline.',
        schema: { type: 'integer', minimum: 2, maximum: 5000, default: 600 },
      },
    ],
    answers: [{ status: 200, description: 'Times, points and crossings.', schema: 'trace' }],
    problems: [...UNKNOWN, 'invalid-query'],
  },
  {
    id: 'listRevisions',
    method: 'get',
    path: '/orbits/:accession/revisions',
    summary: 'What changed in an entry, and when',
    parameters: [ACCESSION],
    answers: [{ status: 200, description: 'Revisions, the newest first.', itemsOf: 'entry-revision' }],
    problems: UNKNOWN,
  },
  {
    id: 'listImages',
    method: 'get',
    path: '/orbits/:accession/images',
    summary: 'Entries that are the image of one under a symmetry of its system',
    parameters: [ACCESSION],
    answers: [{ status: 200, description: 'Images in the catalogue.', itemsOf: 'entry-image' }],
    problems: UNKNOWN,
  },
];
