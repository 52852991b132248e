import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { Mail } from '@/server/mail/mailer';

/** Tries of a mail server that is away, spread over about a day by the queue's growing pauses. */
const MAX_TRIES = 16;

/**
 * Put a mail into the outgoing mail and its sending into the queue, in the transaction of whatever it tells about:
 * without the change no mail, without the mail no change.
 */
export async function queueMail(db: Sequelize, { to, subject, text }: Mail, transaction: Transaction): Promise<void> {
  const [mail] = await db.query<{ id: string }>(
    'insert into outgoing_mail (recipient, subject, body) values ($1, $2, $3) returning id',
    { bind: [to, subject, text], type: QueryTypes.SELECT, transaction },
  );
  await db.query(`select graphile_worker.add_job('send-mail', $1::json, max_attempts => $2)`, {
    bind: [JSON.stringify({ mail: mail!.id }), MAX_TRIES],
    transaction,
  });
}
