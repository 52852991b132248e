import type { Citation } from '@/server/presenters/citation/citation';

/** What BibTeX reads as a command; every other character stays as it is, in UTF-8. */
const ESCAPES: Readonly<Record<string, string>> = {
  '\\': '\\textbackslash{}',
  '{': '\\{',
  '}': '\\}',
  '^': '\\textasciicircum{}',
  '~': '\\textasciitilde{}',
  ...Object.fromEntries(Array.from('%&#$_', (character) => [character, `\\${character}`])),
};

const MONTHS = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];

/** A citation as a BibTeX entry. Names and titles stand in double braces: no style changes their case or order. */
export function toBibtex({ key, author, title, version, date, publisher, address, note }: Citation): string {
  const fields = [
    ['author', `{{${escaped(author)}}}`],
    ['title', `{{${escaped(title)}}}`],
    ['year', `{${date.year}}`],
    ['month', MONTHS[date.month - 1]!],
    ['howpublished', `{${escaped(publisher)}}`],
    ['version', `{${escaped(version)}}`],
    ['number', `{${key}}`],
    // The address is a web address: biblatex and the url package read it verbatim.
    ['url', `{${address}}`],
    ['note', `{${escaped(`${version} of ${date.year}-${two(date.month)}-${two(date.day)}. ${note}`)}}`],
  ] as const;
  return `@misc{${key},\n${fields.map(([name, value]) => `  ${name} = ${value},\n`).join('')}}\n`;
}

const escaped = (text: string): string => Array.from(text, (character) => ESCAPES[character] ?? character).join('');

const two = (number: number): string => String(number).padStart(2, '0');
