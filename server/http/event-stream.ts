import type { Request, Response } from 'express';
import { tooMany } from '@/server/errors';

/** Streams that one client may hold open on this server. */
const MAX_STREAMS = 4;
/** Proxies cut a connection on which nothing comes; a comment comes this often. */
const HEARTBEAT_MS = 15_000;
/** A stream ends by then; the browser asks again by itself. */
const LONGEST_MS = 600_000;
const RETRY_SECONDS = 5;

/** Server-sent events to one client. */
export interface EventStream {
  send(event: string, data: unknown): void;
  end(): void;
}

/** Counts the open streams of each client. */
export class EventStreams {
  private readonly open = new Map<string, number>();

  /**
   * Begin a stream.
   *
   * @param onEnd  Called once, when either side has ended it or its time is over.
   * @throws {Problem} 429 when the client holds too many.
   */
  begin(req: Request, res: Response, { client, onEnd }: { client: string; onEnd: () => void }): EventStream {
    const count = this.open.get(client) ?? 0;
    if (count >= MAX_STREAMS) {
      throw tooMany(
        'too-many-requests',
        `${MAX_STREAMS} streams of events are open; that is the limit.`,
        RETRY_SECONDS,
      );
    }
    this.open.set(client, count + 1);
    res.set({
      'Content-Type': 'text/event-stream; charset=utf-8',
      'Cache-Control': 'no-store',
      'X-Accel-Buffering': 'no',
    });
    res.flushHeaders();
    const heartbeat = setInterval(() => res.write(': \n\n'), HEARTBEAT_MS);
    const longest = setTimeout(() => res.end(), LONGEST_MS);
    res.once('close', () => {
      clearInterval(heartbeat);
      clearTimeout(longest);
      this.release(client);
      onEnd();
    });
    return {
      send: (event, data) => void res.write(`event: ${event}\ndata: ${JSON.stringify(data)}\n\n`),
      end: () => void res.end(),
    };
  }

  private release(client: string): void {
    const count = (this.open.get(client) ?? 1) - 1;
    if (count > 0) this.open.set(client, count);
    else this.open.delete(client);
  }
}
