import { Client } from 'pg';
import { livePostmaster, type Postmaster } from '@/server/cluster/postmaster-file';

/** A server that was killed leaves its process for a moment; one that starts up takes a while to replay its log. */
const PATIENCE_MS = 60_000;
const PAUSE_MS = 250;

/**
 * The server of a data folder once it answers, or null when none is left.
 *
 * @param addressOf  Where the server on a port would answer.
 */
export async function runningServer(
  dataFolder: string,
  addressOf: (port: number) => string,
): Promise<Postmaster | null> {
  for (const end = Date.now() + PATIENCE_MS; Date.now() < end;) {
    const postmaster = livePostmaster(dataFolder);
    if (!postmaster || (await answers(addressOf(postmaster.port)))) return postmaster;
    await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
  }
  throw new Error(`The PostgreSQL server of ${dataFolder} runs, but does not answer`);
}

/** @throws {Error} when the server answers and refuses for good, as with a wrong password. */
async function answers(connectionString: string): Promise<boolean> {
  const db = new Client({ connectionString });
  try {
    await db.connect();
    await db.query('select 1');
    return true;
  } catch (error) {
    if (isPassing(error)) return false;
    throw error;
  } finally {
    await db.end().catch(() => undefined);
  }
}

/** Nobody listens, the connection was cut, or the server is starting up or shutting down (class 57P). */
function isPassing(error: unknown): boolean {
  const code = (error as NodeJS.ErrnoException).code ?? '';
  const cut = error instanceof Error && error.message.startsWith('Connection terminated');
  return cut || ['ECONNREFUSED', 'ECONNRESET', 'EPIPE'].includes(code) || code.startsWith('57P');
}
