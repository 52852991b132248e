import { createHash } from 'node:crypto';
import { spawnSync } from 'node:child_process';
import { chmodSync, mkdirSync } from 'node:fs';
import { homedir } from 'node:os';
import { join } from 'node:path';
import type { Account } from '@/server/cluster/database-account';

/** Others may pass through, and not list what is here: the database's account has to reach its own folder. */
const PASS_THROUGH = 0o711;
/** Enough of the hash to keep any number of checkouts apart. */
const HASH_LENGTH = 16;

/**
 * Where the cluster's data goes: below the state folder if the database's account can enter it, else outside.
 *
 * A checkout below a home that only its owner may enter (root's, for one) cannot hold the data of another account.
 *
 * @returns a folder the account can enter; the data folder is made inside it.
 */
export function dataFolderParent(stateFolder: string, account: Account | null): string {
  const outside = `ritornel-${createHash('sha256').update(stateFolder).digest('hex').slice(0, HASH_LENGTH)}`;
  const candidates = [stateFolder, join('/var/lib', outside), join(homedir(), '.local/state', outside)];
  const found = candidates.find((folder) => canEnter(folder, account));
  if (!found) throw new Error(`The database's account can enter none of these folders: ${candidates.join(', ')}`);
  return found;
}

function canEnter(folder: string, account: Account | null): boolean {
  try {
    mkdirSync(folder, { recursive: true });
    chmodSync(folder, PASS_THROUGH);
  } catch {
    return false;
  }
  if (!account) return true;
  const { uid, gid } = account;
  return spawnSync('/bin/sh', ['-c', 'cd "$0"', folder], { cwd: '/', uid, gid }).status === 0;
}
