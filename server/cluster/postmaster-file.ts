import { readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';

/** The server that runs on a data folder, as PostgreSQL's own lock file tells. */
export interface Postmaster {
  pid: number;
  port: number;
}

/**
 * The live server of a data folder, or null.
 *
 * A lock file left by a killed server is removed when its process is gone, or when the number now belongs to another
 * program or to the server of another folder (after a restart of the machine, or in a copied checkout).
 */
export function livePostmaster(dataFolder: string): Postmaster | null {
  const file = join(dataFolder, 'postmaster.pid');
  const lines = readLines(file);
  if (!lines) return null;
  const [pid, folder, , port] = lines;
  const postmaster = { pid: parseInt(pid ?? '', 10), port: parseInt(port ?? '', 10) };
  if (folder === dataFolder && isPostgres(postmaster.pid)) return postmaster;
  rmSync(file, { force: true });
  return null;
}

function isPostgres(pid: number): boolean {
  const name = readLines(`/proc/${pid}/comm`)?.[0];
  return name === 'postgres' || name === 'postmaster';
}

function readLines(file: string): string[] | null {
  try {
    return readFileSync(file, 'utf8').split('\n');
  } catch {
    return null;
  }
}
