import type { Task } from 'graphile-worker';
import type { Mailer } from '@/server/mail/mailer';

interface Waiting {
  recipient: string;
  subject: string;
  body: string;
}

/**
 * The job that hands one outgoing mail to the mail server.
 *
 * It fails when the server does not take the mail, and the queue tries again later. A worker that dies between sending
 * and noting so sends twice: better than never.
 */
export function sendMail(mailer: Mailer): Task {
  return async (payload, { withPgClient }) => {
    const { mail } = payload as { mail: string };
    const found = await withPgClient((db) =>
      db.query<Waiting>('select recipient, subject, body from outgoing_mail where id = $1 and sent_at is null', [mail]),
    );
    const waiting = found.rows[0];
    if (!waiting) return;
    await mailer.send({ to: waiting.recipient, subject: waiting.subject, text: waiting.body });
    await withPgClient((db) => db.query('update outgoing_mail set sent_at = now() where id = $1', [mail]));
  };
}
