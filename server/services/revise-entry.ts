import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { RefinementObstacle } from '@/schemas/generated/contract';
import type { Refinement } from '@/server/checks/refine-orbit';
import { sameCrossings } from '@/server/checks/same-crossings';
import type { CheckedSystem } from '@/server/formulas/checked-system';
import type { Orbit } from '@/server/models/orbit';
import { type EntryContent, OrbitRevision } from '@/server/models/orbit-revision';
import { System } from '@/server/models/system';
import { crossingPlace } from '@/server/services/entry-figures';
import { systemVersion } from '@/server/services/known-system';
import { numberOf } from '@/server/services/parameters-of';

/** A locked entry and its orbit with many digits. */
interface Refined {
  orbit: Orbit;
  digits: number;
  result: Refinement;
}

/**
 * Give an entry the figures of a refinement, as its next revision, made by the archive itself. The revisions before stay.
 *
 * @returns the revision that has these digits, which is the current one where it has more already; or why there is none.
 */
export async function reviseEntry(
  db: Sequelize,
  { orbit, digits, result }: Refined,
  transaction: Transaction,
): Promise<number | Pick<RefinementObstacle, 'reason' | 'message'>> {
  if (orbit.status === 'withdrawn') return { reason: 'withdrawn', message: 'The entry was withdrawn meanwhile.' };
  if (orbit.evidence !== 're-integrated' && orbit.digits >= digits) return orbit.revision;
  const { number: orbitNumber } = orbit;
  const where = { orbitNumber, revision: orbit.revision };
  const current = await OrbitRevision.findOne({ where, rejectOnEmpty: true, transaction });
  const { checked } = await systemVersion(db, orbit.systemId, orbit.systemVersion);
  if (!isSameOrbit(current.content, result, checked)) {
    const message = 'With more digits the correction leads to another orbit than the one that was accepted.';
    return { reason: 'not-converged', message };
  }
  const revision = orbit.revision + 1;
  const content = refinedContent(current.content, result);
  const why = `Refined to ${digits} digits by the archive.`;
  await OrbitRevision.create(
    { orbitNumber, revision, content, checkId: current.checkId, madeBy: null, why, evidence: 'refined', digits },
    { transaction },
  );
  await keepReferences(db, orbit, revision, transaction);
  await moveCrossings(db, orbit, { content, system: checked }, transaction);
  const { period } = content;
  const obstacle = orbit.obstacle && orbit.obstacle.digits > digits ? orbit.obstacle : null;
  await orbit.update(
    { revision, evidence: 'refined', digits, obstacle, periodDigits: period, period: numberOf(period).value },
    { transaction },
  );
  return revision;
}

/** Whether a refinement is of the orbit that it began with: crossing by crossing, within the tolerance. */
function isSameOrbit({ crossings, extent, closure }: EntryContent, result: Refinement, system: CheckedSystem): boolean {
  if (crossings.length !== result.crossings.length) return false;
  const own = { points: crossings.map(({ point }) => point), extent, tolerance: closure.tolerance };
  const moduli = system.variables.map(({ modulus }) => modulus);
  return sameCrossings(own, { points: result.crossings.map(({ point }) => point) }, moduli);
}

/** The figures of a revision with those that a refinement found; what is known to a few digits only stays. */
const refinedContent = (content: EntryContent, result: Refinement): EntryContent => ({
  ...content,
  point: result.point,
  period: result.period,
  returnTimes: result.returnTimes,
  crossings: result.crossings.map(({ time, point }, i) => ({
    ...{ time, point },
    transversality: content.crossings[i]!.transversality,
  })),
  engine: result.engine,
  refinement: { held: result.held, residual: result.residual },
});

async function keepReferences(
  db: Sequelize,
  { number, revision: before }: Orbit,
  revision: number,
  transaction: Transaction,
): Promise<void> {
  await db.query(
    `insert into reference (orbit_number, revision, position, citation, doi)
     select orbit_number, $3, position, citation, doi from reference where orbit_number = $1 and revision = $2`,
    { bind: [number, before, revision], type: QueryTypes.INSERT, transaction },
  );
}

/** The crossings that searches measure from become the doubles of the refined ones. */
async function moveCrossings(
  db: Sequelize,
  { number, systemId }: Orbit,
  { content, system }: { content: EntryContent; system: CheckedSystem },
  transaction: Transaction,
): Promise<void> {
  const { extents } = await System.findByPk(systemId, { rejectOnEmpty: true, transaction });
  const rows = content.crossings.map(({ time, point: decimals }, index) => {
    const point = decimals.map((decimal) => numberOf(decimal).value);
    return { position: index + 1, time: numberOf(time).value, point, place: crossingPlace(point, extents!, system) };
  });
  await db.query(
    `update crossing c set time = n.time, point = n.point, place = n.place::cube
     from json_to_recordset($3::json) as n(position integer, time float8, point float8[], place text)
     where c.system_id = $1 and c.orbit_number = $2 and c.position = n.position`,
    { bind: [systemId, number, JSON.stringify(rows)], type: QueryTypes.UPDATE, transaction },
  );
}
