import type { Sequelize } from 'sequelize';
import type { CheckRequest } from '@/schemas/generated/contract';
import { invalidContent } from '@/server/errors';
import type { OrbitCheck } from '@/server/models/orbit-check';
import { allowCheck, type Requester } from '@/server/services/allow-check';
import { enqueueCheck } from '@/server/services/enqueue-check';
import { inlineSystem, knownSystem } from '@/server/services/known-system';
import { validateClaim } from '@/server/services/validate-claim';

/**
 * Start a private check: whoever holds its id may read it.
 *
 * @throws {Problem} `unknown-system`, `invalid-content`, `too-many-checks` or `computing-time-used`; nothing is stored.
 */
export async function startCheck(db: Sequelize, requester: Requester, body: CheckRequest): Promise<OrbitCheck> {
  if (!('accountId' in requester) && body.digits !== undefined) {
    const message = 'A number of digits is confirmed for accounts only: sign in, or leave digits out.';
    throw invalidContent([{ pointer: '/digits', message }]);
  }
  const known = typeof body.system === 'string' ? await knownSystem(db, body.system) : null;
  validateClaim(known?.checked ?? inlineSystem(body.system as Exclude<CheckRequest['system'], string>), body);
  return db.transaction(async (transaction) => {
    await allowCheck(db, requester, transaction);
    return enqueueCheck(db, { requester, body, system: known }, transaction);
  });
}
