import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { readClusterSettings, hasClusterSettings, writeClusterSettings } from '@/server/cluster/cluster-settings';
import { type Account, databaseAccount } from '@/server/cluster/database-account';
import { dataFolderParent } from '@/server/cluster/data-folder';
import { freePort } from '@/server/cluster/free-port';
import { makeDataFolder } from '@/server/cluster/make-data-folder';
import { postgresPrograms } from '@/server/cluster/postgres-programs';
import { livePostmaster } from '@/server/cluster/postmaster-file';
import { prepareDatabase } from '@/server/cluster/prepare-database';
import { runProgram } from '@/server/cluster/run-program';
import { runningServer } from '@/server/cluster/running-server';

export interface Cluster {
  /** Database of the product as the servers' role. */
  url: string;
  /** The same as the role that owns everything. */
  ownerUrl: string;
  dataFolder: string;
  /** Whether a server was found running and taken over. */
  adopted: boolean;
  stop(): Promise<void>;
}

export interface ClusterOptions {
  stateFolder: string;
  postgresBin: string | null;
  /** For tests: no care for the data when the machine stops. */
  throwAway?: boolean;
  say?: (line: string) => void;
}

/** A cluster whose programs and places are settled. */
interface Place {
  dataFolder: string;
  programs: string;
  account: Account | null;
}

const HOST = '127.0.0.1';
const OWNER = 'ritornel_owner';
const ROLE = 'ritornel';
const DATABASE = 'ritornel';
/** After a kill -9 of the server its helpers still hold the shared memory for a moment. */
const START_ATTEMPTS = 5;
const ATTEMPT_PAUSE_MS = 2_000;
const START_TIMEOUT_S = 120;
const THROW_AWAY = '-c fsync=off -c synchronous_commit=off -c full_page_writes=off -c max_connections=200';

/**
 * The private PostgreSQL of a state folder: made on first use, started when it does not run, taken over when it does.
 *
 * Loopback only, no socket file, passwords for every connection; the passwords and the port are kept in the folder.
 */
export async function startCluster(options: ClusterOptions): Promise<Cluster> {
  const say = options.say ?? (() => undefined);
  const known = hasClusterSettings(options.stateFolder);
  const settings = readClusterSettings(options.stateFolder);
  const place = settlePlace(options);
  if (!existsSync(place.dataFolder)) {
    say(`Making a private PostgreSQL database in ${place.dataFolder}`);
    await makeDataFolder({ ...place, folder: place.dataFolder, owner: OWNER, password: settings.ownerPassword });
  } else if (!known) {
    throw new Error(
      `${place.dataFolder} holds a database, but its passwords (cluster.json in ${options.stateFolder}) are gone: ` +
        'put that file back, or move the data away to begin anew.',
    );
  }
  const address = (role: 'owner' | 'servers', onPort: number): string =>
    role === 'owner'
      ? `postgres://${OWNER}:${settings.ownerPassword}@${HOST}:${onPort}/`
      : `postgres://${ROLE}:${settings.password}@${HOST}:${onPort}/`;
  const running = await runningServer(place.dataFolder, (onPort) => `${address('owner', onPort)}postgres`);
  const port = running?.port ?? (await startServer(place, settings.port, options.throwAway ?? false));
  writeClusterSettings(options.stateFolder, { ...settings, port });
  say(`PostgreSQL ${running ? 'was running already' : 'runs'} on ${HOST}:${port}, data in ${place.dataFolder}`);
  const ownerUrl = address('owner', port);
  await prepareDatabase({ ownerUrl, database: DATABASE, role: ROLE, password: settings.password });
  return {
    url: address('servers', port) + DATABASE,
    ownerUrl: ownerUrl + DATABASE,
    dataFolder: place.dataFolder,
    adopted: running !== null,
    stop: () => stopServer(place, options.throwAway ? 'immediate' : 'fast'),
  };
}

function settlePlace({ stateFolder, postgresBin }: ClusterOptions): Place {
  const account = databaseAccount();
  const dataFolder = join(dataFolderParent(stateFolder, account), 'database');
  const versionFile = join(dataFolder, 'PG_VERSION');
  const version = existsSync(versionFile) ? readFileSync(versionFile, 'utf8').trim() : null;
  return { dataFolder, account, programs: postgresPrograms(postgresBin, version) };
}

async function startServer(place: Place, remembered: number | null, throwAway: boolean): Promise<number> {
  const log = join(place.dataFolder, 'server.log');
  let said = '';
  for (let attempt = 0; attempt < START_ATTEMPTS; attempt++) {
    if (attempt > 0) await new Promise((resolve) => setTimeout(resolve, ATTEMPT_PAUSE_MS));
    const port = await freePort(HOST, attempt < 2 ? (remembered ?? undefined) : undefined);
    const settings = `-p ${port} -h ${HOST} -k '' ${throwAway ? THROW_AWAY : ''}`;
    const args = ['start', '-w', '-t', `${START_TIMEOUT_S}`, '-D', place.dataFolder, '-l', log, '-o', settings];
    const { code, output } = await runProgram(join(place.programs, 'pg_ctl'), args, place.account);
    if (code === 0) return port;
    said = output;
  }
  throw new Error(`PostgreSQL did not start: ${said}\n  Its log: ${log}\n${lastLines(log)}`);
}

async function stopServer(place: Place, mode: 'fast' | 'immediate'): Promise<void> {
  if (!livePostmaster(place.dataFolder)) return;
  const args = ['stop', '-w', '-D', place.dataFolder, '-m', mode];
  const { code, output } = await runProgram(join(place.programs, 'pg_ctl'), args, place.account);
  if (code !== 0 && livePostmaster(place.dataFolder)) throw new Error(`PostgreSQL did not stop: ${output}`);
}

const LOG_LINES_SHOWN = 12;

function lastLines(file: string): string {
  if (!existsSync(file)) return '';
  return readFileSync(file, 'utf8').trimEnd().split('\n').slice(-LOG_LINES_SHOWN).join('\n');
}
