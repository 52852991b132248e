import { isDeepStrictEqual } from 'node:util';
import type { Sequelize, Transaction } from 'sequelize';
import { System } from '@/server/models/system';
import { SystemVersion } from '@/server/models/system-version';
import { builtInSystems } from '@/server/systems/built-in-systems';

/**
 * Put the systems in place that come with the archive; a document that has changed becomes the next version.
 *
 * Workers that start together wait for each other.
 */
export async function installSystems(db: Sequelize): Promise<void> {
  await db.transaction(async (transaction) => {
    await db.query(`select pg_advisory_xact_lock(hashtextextended('built-in systems', 0))`, { transaction });
    for (const [index, document] of builtInSystems.entries()) {
      await installSystem(document, index + 1, transaction);
    }
  });
}

async function installSystem(
  document: (typeof builtInSystems)[number],
  position: number,
  transaction: Transaction,
): Promise<void> {
  const { slug } = document;
  const system = await System.findOne({ where: { slug }, transaction });
  if (!system) {
    const { id: systemId } = await System.create({ slug, position }, { transaction });
    await SystemVersion.create({ systemId, version: 1, document }, { transaction });
    return;
  }
  if (system.position !== position) await system.update({ position }, { transaction });
  const current = await SystemVersion.findOne({
    where: { systemId: system.id, version: system.currentVersion },
    rejectOnEmpty: true,
    transaction,
  });
  // A later version that somebody proposed and a curator accepted stands above what came with the archive.
  if (current.acceptedBy !== null || isDeepStrictEqual(current.document, document)) return;
  const version = system.currentVersion + 1;
  await SystemVersion.create({ systemId: system.id, version, document }, { transaction });
  await system.update({ currentVersion: version }, { transaction });
}
