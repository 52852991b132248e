import type { Pool } from 'pg';
import type { StoredFile } from '@/server/services/release-files';

/** A release as the database answers it. */
export interface ReleaseRow {
  id: number;
  state: 'cutting' | 'ready' | 'failed';
  note: string;
  cut_by: string;
  asked_at: Date;
  cut_at: Date | null;
  previous: number | null;
  entries: number | null;
  added: number | null;
  revised: number | null;
  gone: number | null;
  failure: string | null;
  files: StoredFile[];
}

/** All releases, the newest first; with an id only that one. */
export async function listReleases(pool: Pool, id: number | null = null): Promise<ReleaseRow[]> {
  const { rows } = await pool.query<ReleaseRow>(
    `select r.id, r.state, r.note, a.name as cut_by, r.asked_at, r.cut_at, r.previous, r.entries, r.added, r.revised,
       r.gone, r.failure,
       (select coalesce(json_agg(json_build_object('name', f.name, 'mediaType', f.media_type, 'bytes', f.bytes,
          'sha256', f.sha256) order by f.name), '[]') from release_file f where f.release_id = r.id) as files
     from release r join account a on a.id = r.cut_by
     where $1::integer is null or r.id = $1 order by r.id desc`,
    [id],
  );
  return rows;
}
