import type { Sequelize } from 'sequelize';
import { RESET_HOURS, resetPasswordMail } from '@/server/mail/account-texts';
import { User } from '@/server/models/user';
import { comparableTime } from '@/server/services/comparable-time';
import { issueToken } from '@/server/services/one-time-token';
import { queueMail } from '@/server/services/queue-mail';

/** Mail a link that sets a new password, if the address has a confirmed account; the caller does not learn which. */
export function requestPasswordReset(db: Sequelize, publicUrl: string, typed: string): Promise<void> {
  return comparableTime(async () => {
    const user = await User.byEmail(typed);
    if (!user?.confirmedAt) return;
    await db.transaction(async (transaction) => {
      const token = await issueToken(db, { userId: user.id, purpose: 'reset', hours: RESET_HOURS }, transaction);
      await queueMail(db, resetPasswordMail(user, publicUrl, token), transaction);
    });
  });
}
