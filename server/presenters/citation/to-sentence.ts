import type { Citation } from '@/server/presenters/citation/citation';

const MONTHS = [
  ...['January', 'February', 'March', 'April', 'May', 'June'],
  ...['July', 'August', 'September', 'October', 'November', 'December'],
];

/** A citation as one sentence: who, what, where, which revision of which day, and the address. */
export function toSentence({ author, title, version, date, publisher, address }: Citation): string {
  const day = `${date.day} ${MONTHS[date.month - 1]} ${date.year}`;
  return `${author}: ${title}. ${publisher}, ${version} of ${day}. ${address}\n`;
}
