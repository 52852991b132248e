import type { CheckedOrbit, SubmissionBody } from '@/schemas/generated/contract';
import { forDrawing } from '@/server/checks/for-drawing';
import type { CheckedSection } from '@/server/formulas/checked-system';
import type { KnownSystem } from '@/server/services/known-system';
import { staffOf } from '@/server/services/staff-of';
import type { Tracer } from '@/server/services/tracer';

/** Points of an incipit: enough for every bend between two crossings, and no more than a phone's pixels. */
const POINTS_A_RETURN = 24;
const FEWEST_POINTS = 96;
const MOST_POINTS = 480;

export interface IncipitParts {
  system: KnownSystem;
  section: CheckedSection;
  body: Pick<SubmissionBody, 'parameters' | 'section'>;
  orbit: CheckedOrbit;
}

/** The coordinate that the section's staff shows, along the orbit: `[time, value]` pairs. */
export async function drawIncipit(tracer: Tracer, { system, section, body, orbit }: IncipitParts): Promise<number[][]> {
  const { document, variables } = system.checked;
  const staff = staffOf(document, section.name);
  const shown = Math.max(
    0,
    variables.findIndex(({ name }) => name === staff.coordinate),
  );
  const { times, points } = await tracer.trace({
    document,
    parameters: body.parameters ?? {},
    section: body.section,
    point: orbit.point,
    period: orbit.period,
    crossings: orbit.crossings,
    points: Math.min(MOST_POINTS, Math.max(FEWEST_POINTS, POINTS_A_RETURN * orbit.returns)),
  });
  return times.map((time, i) => [forDrawing(time), forDrawing(points[i]![shown]!)]);
}
