import type { Pool, PoolClient } from 'pg';
import { readSearch } from '@/server/search/read-search';
import { openExport, type OrbitExport } from '@/server/services/export-orbits';
import { type StoredFile, writeReleaseFile } from '@/server/services/release-files';

/** A file of a release that holds every entry. */
export interface EntriesFile {
  name: string;
  mediaType: string;
  pieces: (found: OrbitExport) => AsyncIterable<string>;
}

interface ReleaseParts {
  entries: readonly EntriesFile[];
  changes: { name: string; mediaType: string; pieces: (changes: AsyncIterable<EntryChange>) => AsyncIterable<string> };
  /** The last file, which describes the others. */
  descriptor: {
    name: string;
    mediaType: string;
    text: (files: readonly StoredFile[], shape: OrbitExport['shape']) => string;
  };
}

/** What became of an entry since the release before. */
export interface EntryChange {
  accession: string;
  change: 'added' | 'revised' | 'withdrawn';
  revision: number | null;
  previous_revision: number | null;
}

const EVERY_ENTRY = readSearch({ sort: 'accession' });
const CHANGES_A_READ = 1000;

/**
 * Cut a release: every accepted entry as it is at this moment, all or nothing.
 *
 * @returns false when it is not to be cut, or was cut before.
 */
export async function cutRelease(pool: Pool, id: number, parts: ReleaseParts): Promise<boolean> {
  const client = await pool.connect();
  let broken = true;
  try {
    await client.query('begin isolation level repeatable read');
    const { rowCount } = await client.query(`select 1 from release where id = $1 and state = 'cutting' for update`, [
      id,
    ]);
    if (rowCount === 1) await writeAll(client, id, parts);
    await client.query('commit');
    broken = false;
    return rowCount === 1;
  } finally {
    client.release(broken);
  }
}

async function writeAll(
  client: PoolClient,
  releaseId: number,
  { entries, changes, descriptor }: ReleaseParts,
): Promise<void> {
  const { rows } = await client.query<{ previous: number | null }>(
    `select max(id) as previous from release where state = 'ready' and id < $1`,
    [releaseId],
  );
  const { previous } = rows[0]!;
  await client.query(
    `insert into release_entry (release_id, orbit_number, revision)
     select $1, number, revision from orbit where status = 'accepted'`,
    [releaseId],
  );
  const files: StoredFile[] = [];
  let shape: OrbitExport['shape'] = { dimension: 0, parameters: [] };
  for (const { name, mediaType, pieces } of entries) {
    const found = await openExport(client, EVERY_ENTRY);
    shape = found.shape;
    files.push(await writeReleaseFile(client, { releaseId, name, mediaType, pieces: pieces(found) }));
  }
  const changed = changes.pieces(changesSince(client, releaseId, previous));
  const { name, mediaType } = changes;
  files.push(await writeReleaseFile(client, { releaseId, name, mediaType, pieces: changed }));
  await writeReleaseFile(client, { releaseId, ...descriptor, pieces: [descriptor.text(files, shape)] });
  await client.query(
    `update release r set state = 'ready', cut_at = now(), previous = $2,
       entries = (select count(*) from release_entry where release_id = r.id),
       added = (${countOf('added')}), revised = (${countOf('revised')}), gone = (${countOf('withdrawn')})
     where id = $1`,
    [releaseId, previous],
  );
}

/** Entries of two releases side by side; $1 is the later. */
const COMPARED = `
  select o.accession, n.revision, p.revision as previous_revision,
    case when p.revision is null then 'added' when n.revision is null then 'withdrawn' else 'revised' end as change
  from (select * from release_entry where release_id = $1) n
  full join (select * from release_entry where release_id = $2) p on p.orbit_number = n.orbit_number
  join orbit o on o.number = coalesce(n.orbit_number, p.orbit_number)
  where n.revision is distinct from p.revision`;

const countOf = (change: EntryChange['change']): string =>
  `select count(*) from (${COMPARED}) c where c.change = '${change}'`;

async function* changesSince(client: PoolClient, id: number, previous: number | null): AsyncGenerator<EntryChange> {
  await client.query(`declare changes no scroll cursor for select * from (${COMPARED}) c order by c.accession`, [
    ...[id, previous],
  ]);
  for (;;) {
    const { rows } = await client.query<EntryChange>(`fetch ${CHANGES_A_READ} from changes`);
    yield* rows;
    if (rows.length < CHANGES_A_READ) break;
  }
  await client.query('close changes');
}

/** Give a release up, and say why. */
export async function failRelease(pool: Pool, id: number, failure: string): Promise<void> {
  await pool.query(`update release set state = 'failed', failure = $2 where id = $1 and state = 'cutting'`, [
    ...[id, failure],
  ]);
}
