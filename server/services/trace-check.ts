import type { Sequelize } from 'sequelize';
import type { SystemDocument, Trace } from '@/schemas/generated/contract';
import type { OrbitCheck } from '@/server/models/orbit-check';
import { reportOf } from '@/server/services/find-check';
import { systemVersion } from '@/server/services/known-system';
import type { Tracer } from '@/server/services/tracer';

/** Draw what a check found: the orbit, or what was typed where there is none. */
export async function traceCheck(db: Sequelize, tracer: Tracer, check: OrbitCheck, points: number): Promise<Trace> {
  const report = await reportOf(check);
  const { body, systemId, systemVersion: version } = check;
  const isKnown = systemId !== null && version !== null;
  const document = isKnown
    ? (await systemVersion(db, systemId, version)).checked.document
    : (body.system as SystemDocument);
  const found = report?.verdict.startsWith('closes') ? report.orbit : null;
  const { point, period } = found ?? body;
  return tracer.trace({
    ...{ document, parameters: body.parameters ?? {}, section: body.section, point, period, points },
    ...(found ? { crossings: found.crossings } : {}),
  });
}
