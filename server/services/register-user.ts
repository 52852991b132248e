import type { Sequelize } from 'sequelize';
import type { Registration } from '@/schemas/generated/contract';
import { alreadyRegisteredMail, CONFIRM_HOURS, confirmAddressMail } from '@/server/mail/account-texts';
import { User } from '@/server/models/user';
import { comparableTime } from '@/server/services/comparable-time';
import { hashPassword } from '@/server/services/hash-password';
import { issueToken } from '@/server/services/one-time-token';
import { queueMail } from '@/server/services/queue-mail';

/**
 * Take a registration and mail a link that confirms the address.
 *
 * An address with a confirmed account gets a mail that says so; the caller learns neither, and waits as long.
 * Registering an unconfirmed address again replaces what was typed before and sends a new link.
 *
 * @throws {Problem} `password-too-long`; nothing is stored then.
 */
export function registerUser(db: Sequelize, publicUrl: string, registration: Registration): Promise<void> {
  return comparableTime(async () => {
    const passwordHash = await hashPassword(registration.password);
    const email = registration.email.trim().toLowerCase();
    const { name, orcid } = registration;
    await db.transaction(async (transaction) => {
      // Two registrations of one address at once: the second waits here, then finds the first's row.
      await db.query('select pg_advisory_xact_lock(hashtextextended($1, 0))', { bind: [email], transaction });
      const known = await User.byEmail(email, transaction);
      if (known?.confirmedAt) {
        await queueMail(db, alreadyRegisteredMail(known, publicUrl), transaction);
        return;
      }
      const typed = { name, email, passwordHash, orcid: orcid ?? null };
      const user = known ? await known.update(typed, { transaction }) : await User.create(typed, { transaction });
      const token = await issueToken(db, { userId: user.id, purpose: 'confirm', hours: CONFIRM_HOURS }, transaction);
      await queueMail(db, confirmAddressMail(user, publicUrl, token), transaction);
    });
  });
}
