import { existsSync, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import type { Environment } from '@/server/config';

const DEBIAN_FOLDER = '/usr/lib/postgresql';
const NEEDED = ['initdb', 'pg_ctl', 'postgres'];

/** The programs of a PostgreSQL server are not on this machine, or not where we look. */
export class MissingPostgres extends Error {
  constructor(folder: string | null) {
    super(
      [
        `PostgreSQL's server programs (${NEEDED.join(', ')}) were not found${folder ? ` in ${folder}` : ''}.`,
        '  On Debian: apt-get install postgresql',
        '  Elsewhere: set POSTGRES_BIN to the folder that holds them, or DATABASE_URL to a database that runs already.',
      ].join('\n'),
    );
    this.name = 'MissingPostgres';
  }
}

/**
 * The folder of PostgreSQL's server programs: the one asked for, else Debian's, else one on the PATH.
 *
 * @param version  Major version of data that exists already: Debian's folder of that version comes first, else the newest.
 * @throws {MissingPostgres} saying what to do.
 */
export function postgresPrograms(asked: string | null, version: string | null): string {
  const environment: Environment = process.env;
  const path = (environment['PATH'] ?? '').split(delimiter);
  const folders = asked ? [asked] : [...debianFolders(version), ...path];
  const found = folders.find((folder) => folder !== '' && NEEDED.every((name) => existsSync(join(folder, name))));
  if (!found) throw new MissingPostgres(asked);
  return found;
}

function debianFolders(version: string | null): string[] {
  if (!existsSync(DEBIAN_FOLDER)) return [];
  const versions = readdirSync(DEBIAN_FOLDER).sort((a, b) => b.localeCompare(a, 'en', { numeric: true }));
  const ordered = version ? [version, ...versions] : versions;
  return ordered.map((each) => join(DEBIAN_FOLDER, each, 'bin'));
}
