import { chmodSync, chownSync, mkdirSync, mkdtempSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { Account } from '@/server/cluster/database-account';
import { runProgram } from '@/server/cluster/run-program';

export interface NewDataFolder {
  folder: string;
  programs: string;
  account: Account | null;
  owner: string;
  password: string;
}

/**
 * Make an empty cluster, passwords required. It appears under its name only when it is complete.
 *
 * @throws {Error} with what initdb said; nothing is left behind.
 */
export async function makeDataFolder(wanted: NewDataFolder): Promise<void> {
  const draft = `${wanted.folder}.new`;
  rmSync(draft, { recursive: true, force: true });
  mkdirSync(draft, { mode: 0o700 });
  giveTo(draft, wanted.account);
  const secrets = mkdtempSync(join(tmpdir(), 'ritornel-'));
  const passwordFile = join(secrets, 'password');
  try {
    writeFileSync(passwordFile, `${wanted.password}\n`, { mode: 0o600 });
    giveTo(passwordFile, wanted.account);
    giveTo(secrets, wanted.account);
    const args = ['-D', draft, '-U', wanted.owner, '-A', 'scram-sha-256', `--pwfile=${passwordFile}`];
    const more = ['-E', 'UTF8', '--locale=C', '--no-instructions'];
    const { code, output } = await runProgram(join(wanted.programs, 'initdb'), [...args, ...more], wanted.account);
    if (code !== 0) throw new Error(`initdb could not make the database in ${wanted.folder}:\n${output}`);
    renameSync(draft, wanted.folder);
  } finally {
    rmSync(secrets, { recursive: true, force: true });
    rmSync(draft, { recursive: true, force: true });
  }
}

function giveTo(path: string, account: Account | null): void {
  chmodSync(path, path.endsWith('password') ? 0o600 : 0o700);
  if (account) chownSync(path, account.uid, account.gid);
}
