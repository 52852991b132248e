import { Client } from 'pg';
import type { Log } from '@/server/log';

/** The channel on which a worker tells that a check has news; the payload is its id. */
export const CHECK_CHANNEL = 'check_news';
/** A lost connection is tried again after this long. */
const RECONNECT_MS = 1_000;

/** Hears at once when a check gets on; one connection for a whole process. */
export interface CheckWatch {
  /**
   * Call back whenever a check has news, and after a lost connection, when news may have been missed.
   *
   * @returns what ends the watching.
   */
  watch(id: string, onNews: () => void): () => void;
  /** Resolves once news can be heard. */
  ready(): Promise<void>;
  close(): Promise<void>;
}

/** A watch that connects when it is first used. */
export function createCheckWatch(databaseUrl: string, log: Log): CheckWatch {
  return new ListeningWatch(databaseUrl, log);
}

class ListeningWatch implements CheckWatch {
  private readonly listeners = new Map<string, Set<() => void>>();
  private connection: Promise<Client> | null = null;
  private closed = false;

  constructor(
    private readonly databaseUrl: string,
    private readonly log: Log,
  ) {}

  watch(id: string, onNews: () => void): () => void {
    const own = this.listeners.get(id) ?? new Set();
    this.listeners.set(id, own.add(onNews));
    void this.ready().catch(() => undefined);
    return () => {
      own.delete(onNews);
      if (own.size === 0 && this.listeners.get(id) === own) this.listeners.delete(id);
    };
  }

  async ready(): Promise<void> {
    this.connection ??= this.connect();
    await this.connection;
  }

  async close(): Promise<void> {
    this.closed = true;
    const client = await this.connection?.catch(() => null);
    await client?.end();
  }

  private async connect(): Promise<Client> {
    const client = new Client({ connectionString: this.databaseUrl });
    client.on('notification', ({ payload }) => this.tell(payload ?? ''));
    client.on('error', (error) => this.lost(error));
    try {
      await client.connect();
      await client.query(`listen ${CHECK_CHANNEL}`);
    } catch (error) {
      this.lost(error as Error);
      throw error;
    }
    return client;
  }

  private tell(id: string): void {
    for (const onNews of [...(this.listeners.get(id) ?? [])]) onNews();
  }

  private lost(error: Error): void {
    this.connection = null;
    if (this.closed) return;
    this.log.warn({ err: error }, 'the connection that listens for checks was lost');
    setTimeout(() => {
      if (this.closed || this.listeners.size === 0) return;
      this.ready().then(
        () => [...this.listeners.keys()].forEach((id) => this.tell(id)),
        () => undefined,
      );
    }, RECONNECT_MS).unref();
  }
}
