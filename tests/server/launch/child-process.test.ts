import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { keepChild } from '@/server/launch/child-process';

let folder: string;
beforeEach(() => void (folder = mkdtempSync(join(tmpdir(), 'ritornel-child-'))));
afterEach(() => rmSync(folder, { recursive: true }));

const pids = () => (existsSync(join(folder, 'probe.log')) ? readFileSync(join(folder, 'probe.log'), 'utf8') : '');
const lines = () => pids().split('\n').filter(Boolean);

const until = async (condition: () => boolean) => {
  for (const end = Date.now() + 30_000; !condition();) {
    if (Date.now() > end) throw new Error('waited in vain');
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
};

const isAlive = (pid: number) => {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
};

/** A process that writes its number and then does what the code says. */
const keep = (code: string, onGiveUp: (error: Error) => void = () => undefined) => {
  const said: string[] = [];
  const child = keepChild({
    name: 'probe',
    program: ['-e', `console.log(process.pid); ${code}`],
    environment: {},
    logFolder: folder,
    say: (line) => said.push(line),
    onGiveUp,
  });
  return { child, said };
};

describe('keepChild', () => {
  it('starts a killed process again and says so', async () => {
    const { child, said } = keep('setInterval(() => {}, 1000)');
    await until(() => lines().length === 1);
    process.kill(parseInt(lines()[0]!, 10), 'SIGKILL');
    await until(() => lines().length === 2);
    expect(said).toEqual(['The probe process ended by SIGKILL: starting it again']);
    await child.stop();
    expect(isAlive(parseInt(lines()[1]!, 10))).toBe(false);
  });

  it('gives up on one that ends again and again, with the end of its log', async () => {
    const error = await new Promise<Error>((resolve) => keep("console.log('no way'); process.exit(3)", resolve));
    expect(error.message).toMatch(/probe process ended with code 3, again[\s\S]*no way/);
    expect(lines().filter((line) => line === 'no way')).toHaveLength(5);
  });

  it('lets a process finish what it does when told to stop', async () => {
    const { child } = keep(
      "setInterval(() => {}, 1000); process.on('SIGTERM', () => setTimeout(() => { console.log('finished'); process.exit(0); }, 500))",
    );
    await until(() => lines().length === 1);
    await new Promise((resolve) => setTimeout(resolve, 200));
    await child.stop();
    expect(lines()).toContain('finished');
  });
});

describe('end-with-parent', () => {
  it('ends a process whose parent was killed', async () => {
    const preload = pathToFileURL('server/setup/end-with-parent.mjs').href;
    const parent = spawn(process.execPath, [
      '-e',
      `const child = require('node:child_process').spawn(process.execPath,
         ['--import', '${preload}', '-e', 'setInterval(() => {}, 1000)'],
         { detached: true, stdio: ['ignore', 'ignore', 'ignore', 'ipc'] });
       console.log(child.pid);`,
    ]);
    const pid = await new Promise<number>((resolve) => {
      parent.stdout.once('data', (chunk: Buffer) => resolve(parseInt(chunk.toString(), 10)));
    });
    await new Promise((resolve) => setTimeout(resolve, 500));
    expect(isAlive(pid)).toBe(true);
    parent.kill('SIGKILL');
    await until(() => !isAlive(pid));
  });
});
