import { LICENCE } from '@/server/caution';
import type { EntryRow } from '@/server/services/entry-rows';

/** What every form of citation says about an entry or a release, as plain text on one line each. */
export interface Citation {
  /** Under which it is known: an accession. */
  key: string;
  /** As they write themselves: people's names are not taken apart. */
  author: string;
  title: string;
  /** Which revision, and that an entry is withdrawn where it is. */
  version: string;
  /** When that revision was made. */
  date: { year: number; month: number; day: number };
  publisher: string;
  address: string;
  note: string;
}

const PUBLISHER = 'Ritornel, a checked archive of periodic orbits';
/** A period in a title is read, not computed with. */
const TITLE_DIGITS = 12;

/**
 * What there is to cite of an entry's current revision.
 *
 * @param publicUrl where the archive is found, without a slash at its end.
 */
export function citationOf(row: EntryRow, publicUrl: string): Citation {
  const returns = `${row.returns} ${row.returns === 1 ? 'return' : 'returns'}`;
  const itinerary = row.itinerary === null ? '' : `, itinerary ${row.itinerary}`;
  const revised = row.revised_at;
  return {
    key: row.accession,
    author: oneLine(row.contributor_name),
    title: `Periodic orbit ${row.accession} of the system ${oneLine(row.system_name)} (T = ${shortPeriod(row)}, ${returns})`,
    version: `revision ${row.revision}${row.status === 'withdrawn' ? ', withdrawn' : ''}`,
    date: { year: revised.getUTCFullYear(), month: revised.getUTCMonth() + 1, day: revised.getUTCDate() },
    publisher: PUBLISHER,
    address: `${publicUrl}/orbits/${row.accession}`,
    note: `Section ${oneLine(row.section_formula)} = 0${itinerary}. ${LICENCE}.`,
  };
}

/** Verified digits, cut and not rounded, after at most twelve decimals. */
function shortPeriod({ content, digits }: EntryRow): string {
  const [whole = '', decimals = ''] = content.period.split('.');
  const known = Math.max(0, Math.min(TITLE_DIGITS, digits - whole.replace(/^0+/, '').length));
  if (decimals.length <= known) return content.period;
  return `${whole}.${decimals.slice(0, known)}…`;
}

const oneLine = (text: string): string => text.replace(/[\p{Cc}\u2028\u2029\s]+/gu, ' ').trim();
