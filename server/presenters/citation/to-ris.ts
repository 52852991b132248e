import type { Citation } from '@/server/presenters/citation/citation';

/** A citation as RIS; lines end in CR LF, as the format has it. */
export function toRis({ key, author, title, version, date, publisher, address, note }: Citation): string {
  const two = (number: number): string => String(number).padStart(2, '0');
  const lines = [
    ['TY', 'DATA'],
    ['ID', key],
    ['AU', author],
    ['TI', title],
    ['PY', String(date.year)],
    ['DA', `${date.year}/${two(date.month)}/${two(date.day)}`],
    ['ET', version],
    ['PB', publisher],
    ['UR', address],
    ['N1', note],
    ['ER', ''],
  ];
  return lines.map(([tag, value]) => `${tag}  - ${value}\r\n`).join('');
}
