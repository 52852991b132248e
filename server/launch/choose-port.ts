import { freePort } from '@/server/cluster/free-port';
import type { Config } from '@/server/config';
import type { RunningStart } from '@/server/launch/start-lock';

/** Processes of a start that was killed end by themselves; this is how long they may take. */
const PATIENCE_MS = 30_000;
const PAUSE_MS = 500;

/**
 * The port to serve on: the configured one, or a free one where it is taken and nobody asked for it by name.
 *
 * @throws {Error} when PORT was set and is taken.
 */
export async function choosePort(
  config: Config,
  earlier: RunningStart | null,
  say: (line: string) => void,
): Promise<number> {
  let port = await freePort(config.host, config.port);
  if (port !== config.port && earlier?.port === config.port) {
    say(`Waiting for the last start to let go of port ${config.port}`);
    for (const end = Date.now() + PATIENCE_MS; port !== config.port && Date.now() < end;) {
      await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
      port = await freePort(config.host, config.port);
    }
  }
  if (port === config.port) return port;
  if (config.portChosen) throw new Error(`Port ${config.port} (PORT) is taken by another program on ${config.host}`);
  say(`Port ${config.port} is taken: using ${port}. PORT sets another.`);
  return port;
}
