import { createServer, type Server } from 'node:net';
import { readConfig } from '@/server/config';
import { freePort } from '@/server/cluster/free-port';
import { choosePort } from '@/server/launch/choose-port';

const HOST = '127.0.0.1';
const SESSION_SECRET = 'k'.repeat(32);
let blocker: Server | null = null;
afterEach(() => {
  blocker?.close();
  blocker = null;
});

const block = async (port: number) => {
  blocker = createServer();
  await new Promise<void>((resolve) => blocker?.listen(port, HOST, resolve));
};

/** A configuration whose port nobody asked for by name, or somebody did. */
const configOf = (port: number, portChosen: boolean) => ({ ...readConfig({ SESSION_SECRET }), port, portChosen });

describe('choosePort', () => {
  it('takes the configured port when it is free', async () => {
    const port = await freePort(HOST);
    expect(await choosePort(configOf(port, false), null, () => undefined)).toBe(port);
  });

  it('takes another and says so when the usual one is taken', async () => {
    const port = await freePort(HOST);
    await block(port);
    const said: string[] = [];
    const chosen = await choosePort(configOf(port, false), null, (line) => said.push(line));
    expect(chosen).not.toBe(port);
    expect(said).toEqual([`Port ${port} is taken: using ${chosen}. PORT sets another.`]);
  });

  it('refuses a taken port that was asked for', async () => {
    const port = await freePort(HOST);
    await block(port);
    await expect(choosePort(configOf(port, true), null, () => undefined)).rejects.toThrow(
      `Port ${port} (PORT) is taken`,
    );
  });

  it('waits for the processes of a killed start to let go', async () => {
    const port = await freePort(HOST);
    await block(port);
    setTimeout(() => blocker?.close(), 700);
    expect(await choosePort(configOf(port, false), { pid: 1, port }, () => undefined)).toBe(port);
  });
});
