import type { OrbitCheck } from '@/server/models/orbit-check';
import { Bell } from '@/server/services/bell';
import type { CheckWatch } from '@/server/services/check-watch';

/** News can be lost with a connection: the database is asked again this often. */
export const ASK_EVERY_MS = 2_000;

/** Whether a check has nothing more to say. */
export const isOver = ({ state }: Pick<OrbitCheck, 'state'>): boolean => state === 'done' || state === 'failed';

/**
 * Wait until a check is over, at most so many seconds.
 *
 * @param signal  Ends the waiting when nobody waits any more.
 * @returns the check as it is then.
 */
export async function waitForCheck(
  watch: CheckWatch,
  check: OrbitCheck,
  { seconds, signal }: { seconds: number; signal: AbortSignal },
): Promise<OrbitCheck> {
  const end = Date.now() + seconds * 1000;
  const bell = new Bell();
  const stop = watch.watch(check.id, () => bell.ring());
  try {
    // What happens before the first reading is in it; what happens after it is heard.
    await watch.ready().catch(() => undefined);
    await check.reload();
    while (!isOver(check) && Date.now() < end && !signal.aborted) {
      await bell.wait(Math.min(ASK_EVERY_MS, end - Date.now()), signal);
      await check.reload();
    }
    return check;
  } finally {
    stop();
  }
}
