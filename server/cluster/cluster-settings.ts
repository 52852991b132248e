import { randomBytes } from 'node:crypto';
import { readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { keptSecret } from '@/server/kept-secret';

/** What a checkout remembers of its private cluster. */
export interface ClusterSettings {
  port: number | null;
  ownerPassword: string;
  password: string;
}

const FILE = 'cluster.json';
const PASSWORD_BYTES = 24;

/** The remembered settings; made with new passwords the first time. Only the owner of the folder can read them. */
export function readClusterSettings(stateFolder: string): ClusterSettings {
  const text = keptSecret(stateFolder, FILE, () =>
    JSON.stringify({ port: null, ownerPassword: newPassword(), password: newPassword() }),
  );
  return JSON.parse(text) as ClusterSettings;
}

export function writeClusterSettings(stateFolder: string, settings: ClusterSettings): void {
  const draft = join(stateFolder, `${FILE}.new`);
  writeFileSync(draft, `${JSON.stringify(settings)}\n`, { mode: 0o600 });
  renameSync(draft, join(stateFolder, FILE));
}

/** Whether a cluster was ever made from this folder. */
export function hasClusterSettings(stateFolder: string): boolean {
  try {
    return readFileSync(join(stateFolder, FILE)).length > 0;
  } catch {
    return false;
  }
}

const newPassword = (): string => randomBytes(PASSWORD_BYTES).toString('base64url');
