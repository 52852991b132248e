import type { Sequelize } from 'sequelize';
import type { Role } from '@/schemas/generated/contract';
import { notFound, Problem } from '@/server/errors';
import { User } from '@/server/models/user';
import { endSignIns } from '@/server/services/end-sign-ins';

/**
 * Set an account's role and end its sign-ins. The same role again changes nothing.
 *
 * @throws {Problem} `not-found`, or `last-administrator` when nobody would be left.
 */
export function changeRole(db: Sequelize, userId: string, role: Role): Promise<User> {
  return db.transaction(async (transaction) => {
    // All administrators are locked, so that two of them cannot lower each other at once.
    const administrators = await User.findAll({
      where: { role: 'administrator' },
      order: [['id', 'ASC']],
      lock: transaction.LOCK.UPDATE,
      transaction,
    });
    const user = await User.findByPk(userId, { lock: transaction.LOCK.UPDATE, transaction });
    if (!user) throw notFound('account');
    if (user.role === role) return user;
    if (user.role === 'administrator' && administrators.length === 1) {
      throw new Problem('last-administrator', 'This is the last administrator: give the role to somebody else first.');
    }
    await user.update({ role }, { transaction });
    await endSignIns(db, user.id, transaction);
    return user;
  });
}
