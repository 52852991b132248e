import type { Citation } from '@/server/presenters/citation/citation';

/** A citation as CSL-JSON: a list of one item. */
export function toCslJson({ key, author, title, version, date, publisher, address, note }: Citation): string {
  const item = {
    id: key,
    type: 'dataset',
    title,
    author: [{ literal: author }],
    issued: { 'date-parts': [[date.year, date.month, date.day]] },
    publisher,
    version,
    number: key,
    URL: address,
    note,
  };
  return `${JSON.stringify([item], null, 2)}\n`;
}
