import type { Sequelize } from 'sequelize';
import { passwordChangedMail } from '@/server/mail/account-texts';
import { User } from '@/server/models/user';
import { endSignIns } from '@/server/services/end-sign-ins';
import { hashPassword } from '@/server/services/hash-password';
import { redeemToken } from '@/server/services/one-time-token';
import { queueMail } from '@/server/services/queue-mail';

/**
 * Set a new password with a mailed token; every sign-in of the account ends.
 *
 * @throws {Problem} `invalid-token` or `password-too-long`; the token stays good in the second case.
 */
export async function resetPassword(
  db: Sequelize,
  publicUrl: string,
  { token, password }: { token: string; password: string },
): Promise<void> {
  const passwordHash = await hashPassword(password);
  await db.transaction(async (transaction) => {
    const userId = await redeemToken(db, { token, purpose: 'reset' }, transaction);
    const user = await User.findByPk(userId, { rejectOnEmpty: true, transaction });
    await user.update({ passwordHash }, { transaction });
    await endSignIns(db, user.id, transaction);
    await queueMail(db, passwordChangedMail(user, publicUrl), transaction);
  });
}
