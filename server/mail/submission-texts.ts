import type { Mail } from '@/server/mail/mailer';

interface Addressee {
  name: string;
  email: string;
}

/** What a mail about a submission tells. */
export interface SubmissionNews {
  number: number;
  /** Address of its page. */
  page: string;
  comment: string | null;
}

const signature = '\n\nRitornel, a checked archive of periodic orbits\n';

const mailOf = (to: Addressee, subject: string, lines: readonly string[]): Mail => ({
  to: to.email,
  subject,
  text: [`Hello ${to.name},`, ...lines].join('\n\n') + signature,
});

const quoted = (comment: string | null): string[] => (comment ? [comment] : []);

/** Mail to the contributor of an accepted submission. */
export const acceptedMail = (to: Addressee, news: SubmissionNews, entry: { accession: string; page: string }): Mail =>
  mailOf(to, `Submission ${news.number} is accepted as ${entry.accession}`, [
    `your submission ${news.number} is in the catalogue now, as ${entry.accession}:`,
    entry.page,
    ...quoted(news.comment),
  ]);

/** Mail to the contributor of a submission that was returned or declined. */
export const refusedMail = (
  to: Addressee,
  news: SubmissionNews,
  decision: { decision: 'returned' | 'declined'; reason: string },
): Mail =>
  mailOf(to, `Submission ${news.number} is ${decision.decision}`, [
    `your submission ${news.number} was ${decision.decision}. Reason: ${decision.reason}.`,
    ...quoted(news.comment),
    decision.decision === 'returned'
      ? `You can change it and send it again; what was said so far stays with it:`
      : `Everything that was said stays here:`,
    news.page,
  ]);

/** Mail to the other side of a discussion. */
export const commentedMail = (to: Addressee, news: SubmissionNews, author: string): Mail =>
  mailOf(to, `${author} commented on submission ${news.number}`, [
    `${author} wrote about submission ${news.number}:`,
    ...quoted(news.comment),
    news.page,
  ]);

/** What came into the queue since the last digest. */
export interface DigestNews {
  /** Submissions that are new since the last digest and wait for a curator. */
  fresh: readonly { number: number; system: string }[];
  /** All that wait for this curator, these included. */
  waiting: number;
  /** Address of the queue. */
  page: string;
}

/** Submissions that a digest names; of more it tells how many. */
const NAMED = 20;

/** The daily mail to a curator about what is new in the queue. */
export function digestMail(to: Addressee, { fresh, waiting, page }: DigestNews): Mail {
  const count = fresh.length === 1 ? 'A new submission waits' : `${fresh.length} new submissions wait`;
  const named = fresh.slice(0, NAMED).map(({ number, system }) => `  ${number}  ${system}`);
  const rest = fresh.length > NAMED ? [`  and ${fresh.length - NAMED} more`] : [];
  return mailOf(to, `${count} for a curator`, [
    `new in the queue since the last of these mails; ${waiting} ${waiting === 1 ? 'waits' : 'wait'} in all:`,
    [...named, ...rest].join('\n'),
    page,
    'This mail comes at most once a day. Turn it off in the menu behind your name.',
  ]);
}
