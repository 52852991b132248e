import { createHash } from 'node:crypto';
import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';

/** What a start leaves for whoever comes next. */
export interface RunningStart {
  pid: number;
  port: number | null;
}

export interface StartLock {
  /** The note of an earlier start that did not end by itself, if there is one. */
  earlier: RunningStart | null;
  note(port: number): void;
  release(): void;
}

/**
 * One start at a time per state folder.
 *
 * The lock is a socket of Linux's abstract namespace: the kernel frees it with the process, also after kill -9.
 *
 * @throws {Error} naming the process and the address of the start that holds it.
 */
export async function takeStartLock(stateFolder: string): Promise<StartLock> {
  const file = join(stateFolder, 'start.json');
  const name = `\0ritornel-start-${createHash('sha256').update(stateFolder).digest('hex')}`;
  const server = createServer();
  const taken = await new Promise<boolean>((resolve, reject) => {
    server.once('error', (error: NodeJS.ErrnoException) =>
      error.code === 'EADDRINUSE' ? resolve(true) : reject(error),
    );
    server.listen(name, () => resolve(false));
  });
  const earlier = readNote(file);
  if (taken) throw new Error(sentence(stateFolder, earlier));
  server.unref();
  mkdirSync(stateFolder, { recursive: true });
  const write = (port: number | null): void => writeFileSync(file, JSON.stringify({ pid: process.pid, port }));
  write(null);
  return {
    earlier,
    note: write,
    release: () => {
      rmSync(file, { force: true });
      server.close();
    },
  };
}

function sentence(stateFolder: string, running: RunningStart | null): string {
  const who = running ? ` (process ${running.pid}${running.port ? `, port ${running.port}` : ''})` : '';
  return (
    `Ritornel is already started from ${stateFolder}${who}. Stop that one first, ` +
    'or set STATE_FOLDER to another folder to run a second one with data of its own.'
  );
}

function readNote(file: string): RunningStart | null {
  try {
    return JSON.parse(readFileSync(file, 'utf8')) as RunningStart;
  } catch {
    return null;
  }
}
