import { linkSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * A secret that this checkout keeps in a file only its owner can read; made on first use.
 *
 * Two processes may ask at once: both get the value of whichever file came first.
 */
export function keptSecret(folder: string, name: string, make: () => string): string {
  const file = join(folder, name);
  const kept = readIfThere(file);
  if (kept) return kept;
  // Other accounts may pass through to the database's folder, but not list what is here.
  mkdirSync(folder, { recursive: true, mode: 0o711 });
  const draft = `${file}.${process.pid}`;
  writeFileSync(draft, `${make()}\n`, { mode: 0o600 });
  try {
    linkSync(draft, file);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error;
  } finally {
    rmSync(draft, { force: true });
  }
  return readFileSync(file, 'utf8').trim();
}

function readIfThere(file: string): string | null {
  try {
    return readFileSync(file, 'utf8').trim();
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}
