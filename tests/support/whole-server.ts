import { type ChildProcess, spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { pathToFileURL } from 'node:url';
import { freePort } from '@/server/cluster/free-port';

export interface DemoAccount {
  email: string;
  password: string;
}

export interface SentMail {
  id: string;
  from: string;
  to: string;
  subject: string;
  date: string;
  text: string;
}

/** The complete product, started as a person starts it, with data of its own. */
export interface WholeServer {
  url: string;
  /** The demo accounts by role: `contributor`, `curator`, `administrator`. */
  accounts: Record<string, DemoAccount>;
  stateFolder: string;
  /** What the start printed so far. */
  printed(): string;
  /** The mails that were sent, the newest first. */
  outbox(): Promise<SentMail[]>;
  /** End it as Ctrl-C does and remove its data. */
  stop(): Promise<void>;
}

/** The first start checks the demo orbits one by one and may build the client before. */
const START_PATIENCE_MS = 540_000;
const POLL_MS = 200;
/** Variables of the person who runs the tests that would change what is tested. */
const OWN_VARIABLES = [
  'DATABASE_URL',
  'DATABASE_OWNER_URL',
  'SMTP_URL',
  'PUBLIC_URL',
  'SESSION_SECRET',
  'DEMO',
  'HOST',
];

/** Start everything on free ports in a new state folder, and wait until it is ready. */
export async function startWholeServer(environment: Record<string, string> = {}): Promise<WholeServer> {
  const stateFolder = mkdtempSync(join(tmpdir(), 'ritornel-whole-'));
  const port = await freePort('127.0.0.1');
  const preload = pathToFileURL(resolve('server/setup/end-with-parent.mjs')).href;
  const child = spawn(process.execPath, ['--import', preload, '--import', 'tsx', 'server/start.ts'], {
    stdio: ['ignore', 'pipe', 'pipe', 'ipc'],
    env: { ...withoutOwn(), NODE_ENV: 'development', PORT: `${port}`, STATE_FOLDER: stateFolder, ...environment },
  });
  let printed = '';
  const collect = (chunk: Buffer): void => void (printed += chunk.toString());
  child.stdout?.on('data', collect);
  child.stderr?.on('data', collect);
  const stop = async (): Promise<void> => {
    await end(child);
    const outside = /Making a private PostgreSQL database in (\S+)/.exec(printed)?.[1];
    if (outside) rmSync(outside, { recursive: true, force: true });
    rmSync(stateFolder, { recursive: true, force: true });
  };
  try {
    const url = await readyAddress(child, () => printed);
    const accounts = JSON.parse(readFileSync(join(stateFolder, 'demo-accounts.json'), 'utf8'));
    return { url, accounts, stateFolder, printed: () => printed, outbox: () => readOutbox(url, stateFolder), stop };
  } catch (error) {
    const logs = ['web.log', 'worker.log'].map((name) => tailOf(join(stateFolder, name))).join('\n');
    await stop();
    throw new Error(`${String(error)}\n${printed}\n${logs}`, { cause: error });
  }
}

async function readyAddress(child: ChildProcess, printed: () => string): Promise<string> {
  for (const patience = Date.now() + START_PATIENCE_MS; Date.now() < patience;) {
    const found = /^Ritornel is ready at (\S+)$/m.exec(printed());
    if (found?.[1]) return found[1];
    if (child.exitCode !== null) throw new Error(`The start ended with code ${child.exitCode}`);
    await new Promise((resolve) => setTimeout(resolve, POLL_MS));
  }
  throw new Error(`Not ready after ${START_PATIENCE_MS} ms`);
}

async function readOutbox(url: string, stateFolder: string): Promise<SentMail[]> {
  const key = readFileSync(join(stateFolder, 'outbox-key'), 'utf8').trim();
  const answer = await fetch(`${url}/outbox.json?key=${encodeURIComponent(key)}`);
  const { items } = (await answer.json()) as { items: SentMail[] };
  return items;
}

async function end(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null || child.signalCode !== null) return;
  const gone = new Promise((resolve) => child.once('exit', resolve));
  child.kill('SIGTERM');
  await gone;
}

function withoutOwn(): NodeJS.ProcessEnv {
  const kept = { ...process.env };
  for (const name of OWN_VARIABLES) Reflect.deleteProperty(kept, name);
  return kept;
}

const LOG_SHOWN = 4_000;
const tailOf = (file: string): string => (existsSync(file) ? readFileSync(file, 'utf8').slice(-LOG_SHOWN) : '');
