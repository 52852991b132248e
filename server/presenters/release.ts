import type { Release } from '@/schemas/generated/contract';
import { CAUTION, LICENCE } from '@/server/caution';
import type { Citation } from '@/server/presenters/citation/citation';
import { toSentence } from '@/server/presenters/citation/to-sentence';
import type { ReleaseRow } from '@/server/services/list-releases';

/** The file that a citation names by its hash. */
const WHOLE = 'orbits.ndjson.gz';

/** A release as the API shows it. */
export function presentRelease(row: ReleaseRow, publicUrl: string): Release {
  const self = `/api/v1/releases/${row.id}`;
  const { entries, added, revised, gone } = row;
  const citation = releaseCitation(row, publicUrl);
  return {
    id: row.id,
    state: row.state,
    note: row.note,
    cutBy: row.cut_by,
    askedAt: row.asked_at.toISOString(),
    cutAt: row.cut_at?.toISOString() ?? null,
    previous: row.previous,
    entries,
    changes: added === null || revised === null || gone === null ? null : { added, revised, withdrawn: gone },
    files: row.files.map((file) => ({ ...file, href: `${self}/files/${file.name}` })),
    citation: citation && toSentence(citation).trim(),
    licence: LICENCE,
    caution: CAUTION,
    failure: row.failure,
    links: { self, page: `/releases/${row.id}` },
  };
}

/** What there is to cite of a release; null until it is ready. */
function releaseCitation({ id, cut_at, entries, files }: ReleaseRow, publicUrl: string): Citation | null {
  const whole = files.find(({ name }) => name === WHOLE);
  if (!cut_at || !whole) return null;
  return {
    key: `ritornel-release-${id}`,
    author: 'Ritornel',
    title: `Ritornel, a checked archive of periodic orbits: release ${id}`,
    version: `release ${id}, ${entries} ${entries === 1 ? 'entry' : 'entries'}`,
    date: { year: cut_at.getUTCFullYear(), month: cut_at.getUTCMonth() + 1, day: cut_at.getUTCDate() },
    publisher: `SHA-256 of ${WHOLE}: ${whole.sha256}`,
    address: `${publicUrl}/releases/${id}`,
    note: LICENCE,
  };
}
