import type { Sequelize } from 'sequelize';
import { User } from '@/server/models/user';
import { redeemToken } from '@/server/services/one-time-token';

/**
 * Confirm the address of an account, which makes it a contributor's.
 *
 * @throws {Problem} `invalid-token`.
 */
export function confirmUser(db: Sequelize, token: string): Promise<void> {
  return db.transaction(async (transaction) => {
    const userId = await redeemToken(db, { token, purpose: 'confirm' }, transaction);
    await User.update(
      { confirmedAt: new Date(), role: 'contributor' },
      { where: { id: userId, confirmedAt: null }, transaction },
    );
  });
}
