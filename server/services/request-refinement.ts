import type { Pool } from 'pg';
import { Op, type Sequelize, type Transaction } from 'sequelize';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import { Problem } from '@/server/errors';
import { Orbit } from '@/server/models/orbit';
import { Refinement } from '@/server/models/refinement';
import { allowCheck } from '@/server/services/allow-check';
import { findEntry } from '@/server/services/find-entry';
import { queueRefinement } from '@/server/services/queue-refinement';
import { SECONDS_A_REFINEMENT } from '@/server/services/refinement-limits';

/** Somebody asks for an entry with more digits. */
export interface RefinementAsked {
  accession: string;
  digits: number;
  accountId: string;
}

/**
 * Have an entry computed to many digits; what is known already, or under way, is not computed again.
 *
 * @throws {Problem} as `findEntry`; `entry-withdrawn`, `too-many-checks` or `computing-time-used`: nothing is stored then.
 */
export async function requestRefinement(
  { db, pool }: { db: Sequelize; pool: Pool },
  { accession, digits, accountId }: RefinementAsked,
): Promise<Refinement> {
  const { number: orbitNumber } = await findEntry(pool, accession);
  return db.transaction(async (transaction) => {
    const orbit = await Orbit.findByPk(orbitNumber, { rejectOnEmpty: true, transaction });
    if (orbit.status === 'withdrawn') {
      throw new Problem('entry-withdrawn', `${orbit.accession} was withdrawn: its numbers stay as they are.`);
    }
    const there = (await made(orbit, digits, transaction)) ?? (await underWay(orbit, digits, transaction));
    if (there) return there;
    await allowCheck(db, { accountId }, transaction);
    return queueRefinement(db, { orbitNumber, digits, askedBy: accountId }, transaction);
  });
}

/**
 * The refinement that gave an entry these digits or more; null where it has fewer. One that came with them, since its
 * check was asked for them, gets a record that says so.
 */
async function made(orbit: Orbit, digits: number, transaction: Transaction): Promise<Refinement | null> {
  if (orbit.evidence === 're-integrated' || orbit.digits < digits) return null;
  const { number: orbitNumber } = orbit;
  const revision = { [Op.not]: null };
  const where = { orbitNumber, digits: { [Op.gte]: digits }, state: 'done', revision } as const;
  const found = await Refinement.findOne({ where, order: [['digits', 'ASC']], transaction });
  const record = { orbitNumber, digits: orbit.digits, askedBy: null, seconds: SECONDS_A_REFINEMENT };
  const end = { revision: orbit.revision, engineVersion: ENGINE_VERSION, finishedAt: new Date() };
  return found ?? Refinement.create({ ...record, state: 'done', ...end }, { transaction });
}

const underWay = (
  { number: orbitNumber }: Orbit,
  digits: number,
  transaction: Transaction,
): Promise<Refinement | null> => {
  const where = { orbitNumber, digits: { [Op.gte]: digits }, state: ['queued', 'running'] };
  return Refinement.findOne({ where, order: [['digits', 'ASC']], transaction });
};
