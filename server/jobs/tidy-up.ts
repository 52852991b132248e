import type { Task } from 'graphile-worker';
import type { Desk } from '@/server/services/desk';
import { expireClaims } from '@/server/services/expire-claims';

/** The job that ends claims whose time is over, and lets go of private checks a week after they were asked for. */
export function tidyUp(desk: Desk): Task {
  return async () => {
    await expireClaims(desk);
    await desk.db.query('select expire_checks()');
  };
}
