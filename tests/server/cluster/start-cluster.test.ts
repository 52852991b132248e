import { existsSync, mkdtempSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { Client } from 'pg';
import { type Cluster, startCluster } from '@/server/cluster/start-cluster';
import { MissingPostgres } from '@/server/cluster/postgres-programs';
import { livePostmaster } from '@/server/cluster/postmaster-file';

const folders: string[] = [];
const running = new Set<Cluster>();

const aFolder = () => {
  const folder = mkdtempSync(join(tmpdir(), 'ritornel-cluster-'));
  folders.push(folder);
  return folder;
};

const start = async (stateFolder: string) => {
  const cluster = await startCluster({ stateFolder, postgresBin: process.env['POSTGRES_BIN'] ?? null });
  running.add(cluster);
  return cluster;
};

afterEach(async () => {
  for (const cluster of running) await cluster.stop();
  running.clear();
});
afterAll(() => {
  for (const folder of folders) rmSync(folder, { recursive: true, force: true });
});

const query = async (url: string, sql: string) => {
  const db = new Client({ connectionString: url });
  await db.connect();
  try {
    return (await db.query<{ value: string }>(sql)).rows;
  } finally {
    await db.end();
  }
};

const pidOf = (cluster: Cluster) => {
  const postmaster = livePostmaster(cluster.dataFolder);
  if (!postmaster) throw new Error('no server runs');
  return postmaster.pid;
};

describe('startCluster', () => {
  it('keeps data over a stop and a start, on the same port', async () => {
    const folder = aFolder();
    const first = await start(folder);
    await query(first.ownerUrl, "create table probe as select 'kept' as value");
    await first.stop();
    const second = await start(folder);
    expect(second.url).toBe(first.url);
    expect(await query(second.ownerUrl, 'select value from probe')).toEqual([{ value: 'kept' }]);
  });

  it('starts again after the server was killed, with what was committed', async () => {
    const folder = aFolder();
    const first = await start(folder);
    await query(first.ownerUrl, "create table probe as select 'committed' as value");
    process.kill(pidOf(first), 'SIGKILL');
    const second = await start(folder);
    expect(await query(second.ownerUrl, 'select value from probe')).toEqual([{ value: 'committed' }]);
  });

  it('takes over a server that still runs', async () => {
    const folder = aFolder();
    const first = await start(folder);
    const second = await start(folder);
    expect(second.adopted).toBe(true);
    expect(pidOf(second)).toBe(pidOf(first));
  });

  it("is not misled by a lock file whose number now is another program's", async () => {
    const folder = aFolder();
    const first = await start(folder);
    const lock = join(first.dataFolder, 'postmaster.pid');
    const lines = readFileSync(lock, 'utf8').split('\n');
    await first.stop();
    writeFileSync(lock, [process.pid, ...lines.slice(1)].join('\n'));
    expect((await start(folder)).adopted).toBe(false);
  });

  it('runs beside the cluster of another folder', async () => {
    const [one, two] = [await start(aFolder()), await start(aFolder())];
    expect(new URL(one.url).port).not.toBe(new URL(two.url).port);
    expect(await query(two.url, "select 'there' as value")).toEqual([{ value: 'there' }]);
  });

  it('lets nobody in without the password, which only the owner of the folder can read', async () => {
    const folder = aFolder();
    const { url } = await start(folder);
    const stranger = new URL(url);
    stranger.password = 'guess';
    await expect(query(stranger.href, 'select 1')).rejects.toThrow(/password authentication failed/);
    expect(statSync(join(folder, 'cluster.json')).mode & 0o777).toBe(0o600);
  });

  it('says what to install, and leaves no data behind, where PostgreSQL is missing', async () => {
    const folder = aFolder();
    const attempt = startCluster({ stateFolder: folder, postgresBin: '/nowhere' });
    await expect(attempt).rejects.toThrow(MissingPostgres);
    await expect(attempt).rejects.toThrow(/apt-get install postgresql/);
    expect(existsSync(join(folder, 'database'))).toBe(false);
  });
});
