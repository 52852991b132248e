import { mkdirSync } from 'node:fs';
import { migrations } from '@/migrations';
import { freePort } from '@/server/cluster/free-port';
import { startCluster } from '@/server/cluster/start-cluster';
import { type Config, readConfig } from '@/server/config';
import { buildClient } from '@/server/launch/build-client';
import { keepChild, turnLog } from '@/server/launch/child-process';
import { choosePort } from '@/server/launch/choose-port';
import { demoLines } from '@/server/launch/demo-lines';
import { expoEnvironment, expoProgram, restartOnChange } from '@/server/launch/development';
import { Running } from '@/server/launch/running';
import { takeStartLock } from '@/server/launch/start-lock';
import { waitUntilReady } from '@/server/launch/wait-until-ready';
import { migrateUp } from '@/server/migrate';

/** With `--dev` the client comes from Expo's development server and the server restarts when its code changes. */
const development = process.argv.includes('--dev');
const say = (line: string): void => console.log(line);

async function start(running: Running): Promise<void> {
  const config = readConfig();
  const lock = await takeStartLock(config.stateFolder);
  running.lock = lock;
  // Asked for by name and taken: that is told at once. The choice itself waits until the port is about to be used.
  if (config.portChosen) await choosePort(config, lock.earlier, say);
  const database = await openDatabase(config, running);
  running.signal.throwIfAborted();
  const ran = await migrateUp(database, migrations);
  if (ran.length > 0) say(`Ran ${ran.length} ${ran.length === 1 ? 'migration' : 'migrations'}`);
  if (!development) await buildClient(say);
  running.signal.throwIfAborted();
  const port = await choosePort(config, lock.earlier, say);
  lock.note(port);
  const address = `http://${config.host.includes(':') ? `[${config.host}]` : config.host}:${port}`;
  await startProcesses(running, config, {
    DATABASE_URL: database.url,
    PORT: `${port}`,
    PUBLIC_URL: process.env['PUBLIC_URL'] ? config.publicUrl : address,
    DEMO: config.demoEntries ? 'on' : config.demo ? 'accounts' : 'off',
    STATE_FOLDER: config.stateFolder,
    NODE_ENV: config.production ? 'production' : 'development',
  });
  await waitUntilReady(reachable(address), say, running.signal);
  running.signal.throwIfAborted();
  for (const line of demoLines(config, address)) say(line);
  say(`Ritornel is ready at ${address}`);
}

async function openDatabase(config: Config, running: Running): Promise<{ url: string; ownerUrl: string }> {
  if (config.databaseUrl !== null) {
    say('Using the database of DATABASE_URL');
    return { url: config.databaseUrl, ownerUrl: config.databaseOwnerUrl ?? config.databaseUrl };
  }
  running.cluster = await startCluster({ ...config, say });
  return running.cluster;
}

async function startProcesses(running: Running, config: Config, environment: Record<string, string>): Promise<void> {
  const logFolder = config.production ? null : config.stateFolder;
  if (logFolder) {
    mkdirSync(logFolder, { recursive: true });
    say(`Starting the web server and the worker. They log to ${logFolder}/web.log and worker.log`);
  }
  const add = (name: string, program: readonly string[], more: Record<string, string> = {}): void => {
    if (logFolder) turnLog(logFolder, name);
    const onGiveUp = (error: Error): void => void fail(running, error);
    running.children.push(
      keepChild({ name, program, environment: { ...environment, ...more }, logFolder, say, onGiveUp }),
    );
  };
  const serverPort = development ? `${await freePort('127.0.0.1')}` : environment['PORT']!;
  add('web', ['--import', 'tsx', 'server/web.ts'], { PORT: serverPort });
  add('worker', ['--import', 'tsx', 'server/worker.ts']);
  if (development) {
    restartOnChange([...running.children], say);
    add('client', expoProgram(environment['PORT']!), expoEnvironment(serverPort));
  }
  if (config.demoEntries)
    say('Waiting until everything is there; the first start checks the demo orbits, which takes a while');
}

/** An address that listens everywhere is asked on loopback. */
const reachable = (address: string): string =>
  address.replace('//0.0.0.0:', '//127.0.0.1:').replace('//[::]:', '//[::1]:');

async function fail(running: Running, error: unknown): Promise<void> {
  console.error(error instanceof Error ? error.message : error);
  await running.end();
  process.exit(1);
}

function endOnSignals(running: Running): void {
  const onSignal = (): void => {
    if (running.signal.aborted) {
      running.hurry();
      return;
    }
    say('Stopping');
    running.end().then(
      () => {
        say('Stopped');
        process.exit(0);
      },
      (error: unknown) => void fail(running, error),
    );
  };
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP'] as const) process.on(signal, onSignal);
}

const running = new Running();
endOnSignals(running);
start(running).catch((error: unknown) => {
  // A start that someone stopped half-way did not fail.
  if (!running.signal.aborted) void fail(running, error);
});
