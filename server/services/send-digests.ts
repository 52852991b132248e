import { Op, QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import { digestMail, type DigestNews } from '@/server/mail/submission-texts';
import { User } from '@/server/models/user';
import { countWaiting } from '@/server/services/count-waiting';
import type { Desk } from '@/server/services/desk';
import { queueMail } from '@/server/services/queue-mail';
import { engineBind, submissionTables, turnOf } from '@/server/services/submission-rows';

/** Two digests to one person are at least so far apart: a day, less what a timetable may be late. */
const APART_HOURS = 20;

/**
 * Mail every curator who wants it what came into the queue since their last digest; nothing new, no mail.
 *
 * @returns how many mails were queued.
 */
export async function sendDigests({ db, publicUrl }: Desk, now = new Date()): Promise<number> {
  const before = new Date(now.getTime() - APART_HOURS * 3_600_000);
  const readers = await User.findAll({
    where: {
      role: ['curator', 'administrator'],
      digest: true,
      confirmedAt: { [Op.not]: null },
      [Op.or]: [{ digestSentAt: null }, { digestSentAt: { [Op.lt]: before } }],
    },
  });
  let sent = 0;
  for (const { id } of readers) {
    const isSent = await db.transaction((transaction) =>
      sendDigest({ db, publicUrl }, { id, before, now }, transaction),
    );
    if (isSent) sent += 1;
  }
  return sent;
}

/** One curator's digest, with the note that it was sent: both or neither. */
async function sendDigest(
  { db, publicUrl }: Desk,
  { id, before, now }: { id: string; before: Date; now: Date },
  transaction: Transaction,
): Promise<boolean> {
  const reader = await User.findByPk(id, { lock: true, transaction });
  if (!reader?.digest || (reader.digestSentAt !== null && reader.digestSentAt >= before)) return false;
  const fresh = await newInQueue(db, reader, transaction);
  if (fresh.length === 0) return false;
  const news: DigestNews = { fresh, waiting: await countWaiting(db, reader), page: `${publicUrl}/desk` };
  await queueMail(db, digestMail(reader, news), transaction);
  await reader.update({ digestSentAt: now }, { transaction });
  return true;
}

/** What was first checked since a curator's last digest, waits for a curator, and is not their own. */
const newInQueue = (
  db: Sequelize,
  { id, digestSentAt }: User,
  transaction: Transaction,
): Promise<{ number: number; system: string }[]> =>
  db.query<{ number: number; system: string }>(
    `select number, system from (
       select s.number, s.owner_id, coalesce(r.body ->> 'system', '') as system, ${turnOf} as turn,
         (select min(v.at) from event v
          where v.submission_id = s.id and v.revision = s.revision and v.kind = 'checked') as checked_at
       from ${submissionTables} where s.review_state = 'submitted') w
     where turn = 'curator' and owner_id <> $2 and checked_at > coalesce($3::timestamptz, '-infinity') order by number`,
    { bind: [engineBind, id, digestSentAt], type: QueryTypes.SELECT, transaction },
  );
