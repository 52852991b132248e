import type { CheckReport, CheckRequest, SystemDocument } from '@/schemas/generated/contract';
import { checkOrbit } from '@/server/checks/check-orbit';
import type { CatalogueOrbit } from '@/server/checks/match-orbits';
import { readClaim } from '@/server/checks/read-claim';
import type { CheckedSystem, ContentError } from '@/server/formulas/checked-system';
import { checkSystem } from '@/server/formulas/check-system';
import { builtInSystems } from '@/server/systems/built-in-systems';

/** What a body leads to: a report, or errors before any computing. */
export type CheckedBody = { report: CheckReport; errors: [] } | { report: null; errors: ContentError[] };

/** The document that a body names or carries. */
export function documentOf({ system }: Pick<CheckRequest, 'system'>): SystemDocument {
  return typeof system === 'string' ? builtInSystems.find(({ slug }) => slug === system)! : system;
}

/** The system of a document that is known to be sound. */
export function soundSystem(document: SystemDocument): CheckedSystem {
  const checked = checkSystem(document);
  if (!checked.ok) throw new Error(checked.errors.map(({ message }) => message).join(' '));
  return checked.system;
}

/** Check a body as the server would: the system first, then the claim, then the orbit. */
export function checkBody(body: CheckRequest, catalogue: CatalogueOrbit[] = []): CheckedBody {
  const checked = checkSystem(documentOf(body));
  if (!checked.ok) return { report: null, errors: checked.errors };
  const read = readClaim(checked.system, body);
  if (!read.ok) return { report: null, errors: read.errors };
  return { report: checkOrbit({ system: checked.system, claim: body, catalogue }), errors: [] };
}

/** An entry as the catalogue would hold it, from the report of its check. */
export function catalogued(accession: string, section: string, { orbit }: CheckReport): CatalogueOrbit {
  const { period, itinerary, crossings } = orbit!;
  return { accession, section, period, itinerary, crossings };
}
