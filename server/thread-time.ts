import { readFileSync, readlinkSync } from 'node:fs';
import { constants, setPriority } from 'node:os';
import { basename } from 'node:path';

/** Where Linux tells of a thread: nanoseconds on a processor, nanoseconds in the queue for one, turns. */
const STATISTICS = '/proc/thread-self/schedstat';
const NS_PER_MS = 1e6;
/** Asking the system takes microseconds, a step of a computation hardly more: it is asked this often. */
const ASKED_EVERY_MS = 50;

/** Milliseconds that this thread has spent on a processor; time on the clock where the system does not tell. */
export function threadMs(): number {
  try {
    return parseInt(readFileSync(STATISTICS, 'latin1'), 10) / NS_PER_MS;
  } catch {
    return performance.now();
  }
}

/** Tells, once this thread has computed for so many seconds, that the time is over. */
export function afterComputing(seconds: number): () => boolean {
  const end = threadMs() + seconds * 1000;
  let askedAt = 0;
  let isOver = false;
  return () => {
    const now = performance.now();
    if (isOver || now - askedAt < ASKED_EVERY_MS) return isOver;
    askedAt = now;
    isOver = threadMs() >= end;
    return isOver;
  };
}

/** Give this thread the lowest priority; where the system does not let a thread have its own, it keeps the process's. */
export function yieldToOthers(): void {
  try {
    const thread = parseInt(basename(readlinkSync('/proc/thread-self')), 10);
    setPriority(thread, constants.priority.PRIORITY_LOW);
  } catch {
    // A computation of the same rank as the others is late, not wrong.
  }
}
