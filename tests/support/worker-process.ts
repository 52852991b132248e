import { type ChildProcess, spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** A real worker in a process of its own. */
export interface WorkerProcess {
  /** End it as the system would, and tell its exit code. */
  stop(): Promise<number | null>;
  /** End it in the middle of whatever it does. */
  kill(): Promise<void>;
  log(): string;
  /** Whether it ended without being asked to. */
  ended(): boolean;
}

/** Start a worker on a database, without demo content. */
export function startWorker(databaseUrl: string, environment: Record<string, string> = {}): WorkerProcess {
  const stateFolder = mkdtempSync(join(tmpdir(), 'ritornel-worker-'));
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/worker.ts'], {
    stdio: ['ignore', 'pipe', 'pipe'],
    env: {
      ...process.env,
      NODE_ENV: 'development',
      DATABASE_URL: databaseUrl,
      STATE_FOLDER: stateFolder,
      DEMO: 'off',
      WORKER_THREADS: '1',
      ...environment,
    },
  });
  let printed = '';
  let isAsked = false;
  const collect = (chunk: Buffer): void => void (printed += chunk.toString());
  child.stdout.on('data', collect);
  child.stderr.on('data', collect);
  const end = async (signal: NodeJS.Signals): Promise<number | null> => {
    isAsked = true;
    await gone(child, () => child.kill(signal));
    rmSync(stateFolder, { recursive: true, force: true });
    return child.exitCode;
  };
  return {
    stop: () => end('SIGTERM'),
    kill: async () => {
      await end('SIGKILL');
    },
    log: () => printed,
    ended: () => !isAsked && (child.exitCode !== null || child.signalCode !== null),
  };
}

async function gone(child: ChildProcess, ask: () => void): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const exit = new Promise((resolve) => child.once('exit', resolve));
  ask();
  await exit;
}
