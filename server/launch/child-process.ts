import { type ChildProcess, spawn } from 'node:child_process';
import { closeSync, openSync, readFileSync, renameSync, rmSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';

export interface ChildOptions {
  /** `web` or `worker`: the name of its log and in messages. */
  name: string;
  /** Arguments of Node: the program and what it gets. */
  program: readonly string[];
  environment: Readonly<Record<string, string>>;
  /** Folder for its log; null lets it write to the output of this process. */
  logFolder: string | null;
  say: (line: string) => void;
  /** Called when it ends again and again. */
  onGiveUp: (error: Error) => void;
}

/** A process that is started again when it ends by itself. */
export interface KeptChild {
  stop(): Promise<void>;
  /** Let it end, and start it from the code as it is now. */
  restart(): void;
  kill(): void;
}

const RESTART_PAUSE_MS = 1_000;
/** This many ends within the window are no accident any more. */
const MAX_ENDS = 5;
const WINDOW_MS = 60_000;
/** A worker may finish a piece of work first; its jobs are safe in the database after that, too. */
const STOP_PATIENCE_MS = 30_000;
const LOG_LINES_SHOWN = 20;

/** Start one of the product's processes and keep it running until told to stop. */
export function keepChild(options: ChildOptions): KeptChild {
  const ends: number[] = [];
  let stopping = false;
  let asked = false;
  let timer: NodeJS.Timeout | undefined;
  let child = launch(options);
  const again = (): void => {
    asked = false;
    child = launch(options);
    watch();
  };
  const watch = (): void => {
    child.once('exit', (code, signal) => {
      if (stopping) return;
      if (asked) {
        again();
        return;
      }
      const now = Date.now();
      ends.push(now);
      const how = signal ? `by ${signal}` : `with code ${code}`;
      if (ends.filter((time) => time > now - WINDOW_MS).length >= MAX_ENDS) {
        options.onGiveUp(new Error(`The ${options.name} process ended ${how}, again.\n${lastLines(options)}`));
        return;
      }
      options.say(`The ${options.name} process ended ${how}: starting it again`);
      timer = setTimeout(again, RESTART_PAUSE_MS);
    });
  };
  watch();
  return {
    stop: () => {
      stopping = true;
      clearTimeout(timer);
      return end(child);
    },
    restart: () => {
      asked = true;
      void end(child);
    },
    kill: () => void child.kill('SIGKILL'),
  };
}

function launch({ name, program, environment, logFolder }: ChildOptions): ChildProcess {
  const output = logFolder ? openLog(join(logFolder, `${name}.log`)) : 'inherit';
  const preload = pathToFileURL(resolve('server/setup/end-with-parent.mjs')).href;
  const child = spawn(process.execPath, ['--import', preload, ...program], {
    // In a process group of its own: Ctrl-C reaches `npm start` alone, which then stops things in order.
    detached: true,
    stdio: ['ignore', output, output, 'ipc'],
    env: { ...process.env, ...environment },
  });
  if (typeof output === 'number') closeSync(output);
  return child;
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = new Promise<void>((done) => child.once('exit', () => done()));
  child.kill('SIGTERM');
  const timer = setTimeout(() => child.kill('SIGKILL'), STOP_PATIENCE_MS);
  await gone;
  clearTimeout(timer);
  endGroup(child);
}

/** Helpers that the process left behind (a compiler, a download) go with it. */
function endGroup({ pid }: ChildProcess): void {
  if (pid === undefined) return;
  try {
    process.kill(-pid, 'SIGKILL');
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ESRCH') throw error;
  }
}

function openLog(file: string): number {
  return openSync(file, 'a', 0o600);
}

/** Begin a new log; the one of the last start stays beside it. */
export function turnLog(logFolder: string, name: string): void {
  const file = join(logFolder, `${name}.log`);
  rmSync(`${file}.last`, { force: true });
  try {
    renameSync(file, `${file}.last`);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ENOENT') throw error;
  }
}

function lastLines({ logFolder, name }: ChildOptions): string {
  if (!logFolder) return '';
  const lines = readFileSync(join(logFolder, `${name}.log`), 'utf8')
    .trimEnd()
    .split('\n');
  return `The end of its log:\n${lines.slice(-LOG_LINES_SHOWN).join('\n')}`;
}
