import { readFileSync } from 'node:fs';

/** The account that PostgreSQL's programs run under. */
export interface Account {
  uid: number;
  gid: number;
  name: string;
}

/** In this order: Debian's own account for the database, then the one without any rights. */
const CANDIDATES = ['postgres', 'nobody'];

/**
 * PostgreSQL refuses to run as root, so root lends it another account.
 *
 * @returns null for an ordinary user, who runs it directly.
 */
export function databaseAccount(): Account | null {
  if (process.getuid?.() !== 0) return null;
  const accounts = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .map((line) => line.split(':'));
  for (const name of CANDIDATES) {
    const found = accounts.find(([account]) => account === name);
    if (found?.[2] && found[3]) return { name, uid: parseInt(found[2], 10), gid: parseInt(found[3], 10) };
  }
  throw new Error(`Root can't run PostgreSQL itself, and none of these accounts exists: ${CANDIDATES.join(', ')}`);
}
