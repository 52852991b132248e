import { QueryTypes } from 'sequelize';
import type { CheckReport, SubmissionBody } from '@/schemas/generated/contract';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { notFound, Problem } from '@/server/errors';
import { parseSection } from '@/server/formulas/parse-section';
import type { OrbitCheckState } from '@/server/models/orbit-check';
import type { AcceptanceParts } from '@/server/services/accept-submission';
import type { Desk } from '@/server/services/desk';
import { drawIncipit } from '@/server/services/draw-incipit';
import type { ClosedReport } from '@/server/services/entry-figures';
import type { Person } from '@/server/services/find-submission';
import { isCurator } from '@/server/services/find-submission';
import { systemVersion } from '@/server/services/known-system';
import type { Tracer } from '@/server/services/tracer';

interface Found {
  revision: number;
  owner_id: string;
  body: SubmissionBody;
  system_id: string;
  system_version: number;
  current_version: number;
  check_id: string | null;
  state: OrbitCheckState | null;
  checked_version: number | null;
  engine_version: string | null;
  started_at: Date;
  report: CheckReport | null;
}

/**
 * Find what the acceptance of a submission would stand on, and draw its incipit.
 *
 * @returns the problem that stands against it, to be told once rights and version have been tested.
 * @throws {Problem} 404 for everybody but its owner and curators.
 */
export async function findAcceptance(
  desk: Desk & { tracer: Tracer },
  id: string,
  person: Person,
): Promise<AcceptanceParts | Problem> {
  const [found] = await desk.db.query<Found>(
    `select s.revision, s.owner_id, r.body, r.system_id, r.system_version, y.current_version,
       c.id as check_id, c.state, c.system_version as checked_version, c.engine_version, c.started_at, p.report
     from submission s
     join submission_revision r on r.submission_id = s.id and r.revision = s.revision
     left join system y on y.id = r.system_id
     left join lateral (select * from orbit_check c where c.submission_id = s.id and c.revision = s.revision
       order by c.created_at desc limit 1) c on true
     left join check_report p on p.check_id = c.id
     where s.id = $1`,
    { bind: [id], type: QueryTypes.SELECT },
  );
  if (!found || !(found.owner_id === person.id || isCurator(person))) throw notFound('submission');
  const problem = problemWith(found);
  if (problem) return problem;
  const system = await systemVersion(desk.db, found.system_id, found.checked_version!);
  const parsed = parseSection(system.checked, found.body.section);
  if (!parsed.ok)
    return new Problem('stale-check', parsed.errors[0]?.message ?? 'The section does not parse any more.');
  const report = found.report as ClosedReport;
  const { section } = parsed;
  const incipit = await drawIncipit(desk.tracer, { system, section, body: found.body, orbit: report.orbit });
  const { revision, body } = found;
  return {
    revision,
    body,
    checkId: found.check_id!,
    comparedAt: found.started_at,
    system,
    section,
    report,
    incipit,
  };
}

/** What stands against accepting; null when nothing does. */
function problemWith(found: Found): Problem | null {
  const { state, report } = found;
  if (state === null || state === 'queued' || state === 'running' || state === 'failed' || report === null) {
    return new Problem('check-missing', 'There is no finished check of this revision: wait for it, or check it again.');
  }
  if (found.engine_version !== ENGINE_VERSION || found.checked_version !== found.current_version) {
    return new Problem('stale-check', 'The engine or the system has a newer version since this check. Check it again.');
  }
  const blocker = report.findings.find(({ severity }) => severity === 'blocker');
  if (blocker) return new Problem('blocked-by-finding', `A finding stands against accepting it: ${blocker.message}`);
  if (report.orbit === null || report.closure === null || !report.verdict.startsWith('closes')) {
    return new Problem(
      'blocked-by-finding',
      `The check's verdict is ${report.verdict}: only closed orbits are accepted.`,
    );
  }
  return null;
}
