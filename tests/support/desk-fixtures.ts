import type { Check, CheckReport, Session, Submission, SubmissionPage, User } from '@/schemas/generated/contract';
import { entryAB } from './lorenz-fixtures';

const at = '2026-03-14T10:00:00.000Z';

/** The report of the orbit AB, as the check of an entry gives it. */
export const reportAB: CheckReport = {
  verdict: 'closes',
  closure: entryAB.closure,
  correction: entryAB.correction,
  orbit: {
    point: entryAB.point,
    period: entryAB.period,
    returns: 2,
    prime: true,
    crossings: entryAB.crossings.map((crossing, i) => ({ ...crossing, returnTime: entryAB.returnTimes[i] ?? '0' })),
    multipliers: entryAB.multipliers,
    unitMultipliers: 1,
    exponents: entryAB.exponents,
    selfCheck: { flow: 3e-17, liouville: 1e-14, pairing: null },
    stability: 'saddle',
    unstableDirections: 1,
    itinerary: 'AB',
    smallestTransversality: 0.94,
    extent: entryAB.extent,
    invariants: [],
    winding: null,
  },
  findings: [],
  matches: [],
  digits: { typed: 13, confirmed: 15 },
  expectedClosure: 6e-12,
  endPoint: null,
  suggestion: null,
  engine: { version: '1.0.0', steps: 61, cpuMs: 3.2 },
};

export const checkAB: Check = {
  id: 'c1',
  checkState: 'done',
  body: { system: 'lorenz', section: 'z-27', point: ['1', '2', '27'], period: '1.5586' },
  progress: null,
  failure: null,
  createdAt: at,
  ...reportAB,
};

export const curator: User = {
  id: 'u2',
  name: 'Paul Weidner',
  email: 'paul@example.org',
  orcid: null,
  role: 'curator',
  confirmed: true,
  createdAt: at,
};

export const sessionOf = (user: User | null): Session => ({
  user,
  waiting: user ? 1 : 0,
  digest: user && user.role !== 'contributor' ? true : null,
  development: false,
});

export const submissionAB: Submission = {
  id: 's1',
  number: 41,
  revision: 1,
  reviewState: 'submitted',
  checkState: 'done',
  turn: 'curator',
  verdict: 'closes',
  report: reportAB,
  reportIsCurrent: true,
  check: 'c1',
  failure: null,
  progress: null,
  body: { ...entryAB.submitted },
  owner: { id: 'u1', name: 'Ada Contributor' },
  isMine: false,
  claim: null,
  blocked: false,
  decision: null,
  accession: null,
  createdAt: at,
  sentAt: at,
  updatedAt: at,
  revisions: [{ revision: 1, at, body: { ...entryAB.submitted }, check: 'c1' }],
  events: [
    {
      id: 1,
      at,
      who: 'Ada Contributor',
      kind: 'sent',
      from: 'draft',
      to: 'submitted',
      revision: 1,
      report: null,
      reason: null,
      comment: null,
    },
  ],
  comments: [],
  links: { self: '/api/v1/submissions/s1' },
};

export function submissionPage(...items: Submission[]): SubmissionPage {
  return {
    items: items.map(({ revisions: _r, events: _e, comments: _c, links: _l, ...summary }) => summary),
    next: null,
    total: { value: items.length, relation: 'exact' },
    turns: { curator: items.length, contributor: 0, machine: 0 },
  };
}
