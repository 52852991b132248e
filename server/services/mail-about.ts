import type { Transaction } from 'sequelize';
import type { ReasonCode } from '@/schemas/generated/contract';
import { acceptedMail, commentedMail, refusedMail, type SubmissionNews } from '@/server/mail/submission-texts';
import type { Mail } from '@/server/mail/mailer';
import { Orbit } from '@/server/models/orbit';
import type { Submission } from '@/server/models/submission';
import { User } from '@/server/models/user';
import type { Change, Desk } from '@/server/services/desk';
import { queueMail } from '@/server/services/queue-mail';

const reasons: Readonly<Record<ReasonCode, string>> = {
  'does-not-close': 'it does not close',
  'not-transverse': 'it does not cross the section transversely',
  'already-known': 'it is already in the catalogue',
  'not-prime': 'it is not prime',
  'wrong-system-or-parameters': 'wrong system or parameters',
  'out-of-scope': 'out of scope',
  'description-lacking': 'the description is lacking',
};

/** Queue the mails that a change calls for: a decision to the owner, a comment to the other side. */
export async function mailAbout(
  desk: Desk,
  submission: Submission,
  change: Change,
  transaction: Transaction,
): Promise<void> {
  const mails = await mailsOf(desk, submission, change, transaction);
  for (const mail of mails) await queueMail(desk.db, mail, transaction);
}

async function mailsOf(
  { publicUrl }: Desk,
  submission: Submission,
  change: Change,
  transaction: Transaction,
): Promise<Mail[]> {
  const news: SubmissionNews = {
    number: submission.number,
    page: `${publicUrl}/desk/${submission.id}`,
    comment: change.comment ?? null,
  };
  const find = (id: string): Promise<User> => User.findByPk(id, { rejectOnEmpty: true, transaction });
  switch (change.kind) {
    case 'accepted': {
      const { accession } = await Orbit.findByPk(submission.entryNumber!, { rejectOnEmpty: true, transaction });
      const entry = { accession, page: `${publicUrl}/orbits/${accession}` };
      return [acceptedMail(await find(submission.ownerId), news, entry)];
    }
    case 'returned':
    case 'declined': {
      const decision = { decision: change.kind, reason: reasons[change.reason!] };
      return [refusedMail(await find(submission.ownerId), news, decision)];
    }
    case 'commented': {
      const reader = change.actorId === submission.ownerId ? submission.claimedBy : submission.ownerId;
      if (reader === null || reader === change.actorId) return [];
      return [commentedMail(await find(reader), news, (await find(change.actorId!)).name)];
    }
    default:
      return [];
  }
}
