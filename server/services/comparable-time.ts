import { setTimeout as pause } from 'node:timers/promises';

/** Longer than any of the ways through the accounts' calls takes on an unloaded machine. */
const FLOOR_MS = process.env['NODE_ENV'] === 'test' ? 60 : 400;

/**
 * Do some work and be done no earlier than a fixed time after the beginning, so that the time taken does not tell
 * which way the work went. Failures wait as well.
 */
export async function comparableTime<T>(work: () => Promise<T>): Promise<T> {
  const [result] = await Promise.allSettled([work(), pause(FLOOR_MS)]);
  if (result.status === 'rejected') throw result.reason;
  return result.value;
}
