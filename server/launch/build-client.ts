import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';

/** The bundler's cache: one of this checkout's own, since another account may own the one in the common folder. */
const CACHE = resolve('build', 'cache');
/** Everything that the web client is made from. */
const SOURCES = [
  ...['app', 'features', 'schemas/generated', 'assets', 'public'],
  ...['app.json', 'metro.config.js', 'tsconfig.json', 'package-lock.json'],
];
const TARGET = 'dist';
const STAMP = '.stamp';
const OUTPUT_SHOWN = 4_000;

/**
 * Build the web client into `dist/` unless it is there and made from exactly these sources.
 *
 * It is built elsewhere and moved into place, so that a server never sees half of one.
 *
 * @throws {Error} with the end of what the bundler said.
 */
export async function buildClient(say: (line: string) => void): Promise<void> {
  const stamp = hashOf(SOURCES);
  if (readStamp() === stamp) return;
  say('Building the web client. This takes a minute or two.');
  const draft = join('build', `client-${process.pid}`);
  rmSync(draft, { recursive: true, force: true });
  mkdirSync(CACHE, { recursive: true });
  try {
    await exportWeb(draft);
    writeFileSync(join(draft, STAMP), stamp);
    rmSync(TARGET, { recursive: true, force: true });
    renameSync(draft, TARGET);
  } finally {
    rmSync(draft, { recursive: true, force: true });
  }
}

function readStamp(): string | null {
  const file = join(TARGET, STAMP);
  return existsSync(file) ? readFileSync(file, 'utf8') : null;
}

function hashOf(paths: readonly string[]): string {
  const hash = createHash('sha256');
  for (const file of paths.flatMap(filesBelow)) hash.update(`${file}\0`).update(readFileSync(file)).update('\0');
  return hash.digest('hex');
}

function filesBelow(path: string): string[] {
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [path];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesBelow(join(path, name)));
}

function exportWeb(folder: string): Promise<void> {
  const args = [require.resolve('expo/bin/cli'), 'export', '--platform', 'web', '--output-dir', folder];
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, args, {
      stdio: ['ignore', 'pipe', 'pipe'],
      env: {
        ...process.env,
        TMPDIR: CACHE,
        NODE_ENV: 'production',
        EXPO_OFFLINE: '1',
        EXPO_NO_TELEMETRY: '1',
        CI: '1',
      },
    });
    let output = '';
    const collect = (chunk: Buffer): void => void (output += chunk.toString());
    child.stdout.on('data', collect);
    child.stderr.on('data', collect);
    child.on('error', reject);
    child.on('close', (code) => {
      if (code === 0) resolve();
      else reject(new Error(`The web client could not be built:\n${output.slice(-OUTPUT_SHOWN)}`));
    });
  });
}
