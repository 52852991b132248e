import type { Entry, Reference, RefinementObstacle, Stability } from '@/schemas/generated/contract';
import type { EntryContent } from '@/server/models/orbit-revision';

/** An entry as the database answers it, joined with its system, its section, one revision and its people. */
export interface EntryRow {
  number: number;
  accession: string;
  revision: number;
  status: Entry['status'];
  slug: string;
  system_version: number;
  system_name: string;
  section_name: string | null;
  section_formula: string;
  parameters: Record<string, string>;
  returns: number;
  stability: Stability;
  itinerary: string | null;
  /** How the figures of this revision are known. */
  evidence: Entry['evidence']['level'];
  digits: number;
  obstacle: RefinementObstacle | null;
  /** The newest revision there is. */
  current_revision: number;
  incipit: number[][];
  content: EntryContent;
  /** When the revision was made. */
  revised_at: Date;
  references: Reference[];
  contributor_name: string;
  contributor_orcid: string | null;
  curator_name: string;
  curator_orcid: string | null;
  submitted_at: Date;
  accepted_at: Date;
  withdrawn_at: Date | null;
  withdrawal_reason: string | null;
  replacement: string | null;
}

/** Columns of an `EntryRow` over `entryTables`. */
export const entryColumns = `
  o.number, o.accession, r.revision, o.revision as current_revision, o.status, s.slug, o.system_version, v.document ->> 'name' as system_name,
  c.name as section_name, c.formula as section_formula, o.parameters, o.returns, o.stability, o.itinerary, r.evidence,
  r.digits, o.obstacle, o.incipit, r.content, r.at as revised_at,
  (select coalesce(json_agg(json_strip_nulls(json_build_object('citation', f.citation, 'doi', f.doi)) order by f.position), '[]')
   from reference f where f.orbit_number = o.number and f.revision = r.revision) as "references",
  a.name as contributor_name, a.orcid as contributor_orcid, k.name as curator_name, k.orcid as curator_orcid,
  o.submitted_at, o.accepted_at, o.withdrawn_at, o.withdrawal_reason,
  (select p.accession from orbit p where p.number = o.replacement) as replacement`;

/** Tables that `entryColumns` reads from, behind `orbit o`: with each entry's current revision. */
export const entryTables = tablesWith('o.revision');

/** The same with another revision, an expression of SQL. */
export function tablesWith(revision: string): string {
  return `
  join system s on s.id = o.system_id
  join system_version v on v.system_id = o.system_id and v.version = o.system_version
  join section c on c.id = o.section_id
  join orbit_revision r on r.orbit_number = o.number and r.revision = ${revision}
  join account a on a.id = o.contributor_id
  join account k on k.id = o.curator_id`;
}
