import type { Entry } from '@/schemas/generated/contract';
import { CAUTION, LICENCE } from '@/server/caution';
import type { EntryRow } from '@/server/services/entry-rows';

/** An entry as the API and every export show it. */
export const presentEntry = ({ content, ...row }: EntryRow): Entry => ({
  accession: row.accession,
  revision: row.revision,
  status: row.status,
  system: { slug: row.slug, version: row.system_version, name: row.system_name },
  parameters: row.parameters,
  section: { name: row.section_name, formula: row.section_formula },
  point: content.point,
  returns: row.returns,
  period: content.period,
  returnTimes: content.returnTimes,
  crossings: content.crossings,
  itinerary: row.itinerary,
  multipliers: content.multipliers,
  unitMultipliers: content.unitMultipliers,
  exponents: content.exponents,
  stability: row.stability,
  unstableDirections: content.unstableDirections,
  smallestTransversality: content.smallestTransversality,
  extent: content.extent,
  invariants: content.invariants,
  closure: content.closure,
  correction: content.correction,
  verdict: content.verdict,
  findings: content.findings,
  evidence: {
    level: row.evidence,
    digits: row.digits,
    engine: content.engine,
    held: content.refinement?.held ?? null,
    obstacle: row.obstacle,
  },
  submitted: content.submitted,
  contributor: { name: row.contributor_name, orcid: row.contributor_orcid },
  curator: { name: row.curator_name, orcid: row.curator_orcid },
  submittedAt: row.submitted_at.toISOString(),
  acceptedAt: row.accepted_at.toISOString(),
  references: row.references,
  note: content.note,
  licence: LICENCE,
  withdrawal: withdrawalOf(row),
  caution: CAUTION,
  links: {
    self: entryAddress(row),
    page: `/orbits/${row.accession}`,
    trace: `/api/v1/orbits/${row.accession}/trace`,
    system: `/api/v1/systems/${row.slug}`,
  },
});

/** Where a revision stands: the current one without its number. */
const entryAddress = ({ accession, revision, current_revision }: Omit<EntryRow, 'content'>): string =>
  `/api/v1/orbits/${accession}${revision === current_revision ? '' : `?revision=${revision}`}`;

const withdrawalOf = ({
  withdrawn_at,
  withdrawal_reason,
  replacement,
}: Omit<EntryRow, 'content'>): Entry['withdrawal'] =>
  withdrawn_at && withdrawal_reason !== null
    ? { at: withdrawn_at.toISOString(), reason: withdrawal_reason, replacement }
    : null;
