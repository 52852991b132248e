import type { Sequelize, Transaction } from 'sequelize';
import { Problem } from '@/server/errors';
import type { Submission } from '@/server/models/submission';
import { TOLERANCE_DEFAULT } from '@/server/checks/limits';
import { createEntry, type EntryParts } from '@/server/services/create-entry';
import { numberOf, parametersOf } from '@/server/services/parameters-of';
import { refuseKnownOrbit } from '@/server/services/refuse-known-orbit';

/** What an acceptance stands on: the report, and what was drawn from it. */
export interface AcceptanceParts extends Omit<EntryParts, 'submission' | 'curatorId'> {
  /** Revision of the submission for which it was found. */
  revision: number;
  /** The check compared the orbit with everything that was in the catalogue then. */
  comparedAt: Date;
}

/**
 * Make an entry of a locked submission that its curator accepts.
 *
 * @returns the entry's number.
 * @throws {Problem} `stale-check` or `already-known`.
 */
export async function acceptSubmission(
  db: Sequelize,
  submission: Submission,
  parts: AcceptanceParts & { curatorId: string },
  transaction: Transaction,
): Promise<number> {
  if (parts.revision !== submission.revision) {
    throw new Problem('stale-check', 'A new revision came in meanwhile: look at its check first.');
  }
  const { system, section, report, comparedAt, body } = parts;
  const tolerance = body.tolerance === undefined ? TOLERANCE_DEFAULT : numberOf(body.tolerance).value;
  const parametersHash = parametersOf(system.checked, body.parameters).hash;
  await refuseKnownOrbit(
    db,
    { system, section, parametersHash, orbit: report.orbit, tolerance, comparedAt },
    transaction,
  );
  return createEntry(db, { ...parts, submission }, transaction);
}
