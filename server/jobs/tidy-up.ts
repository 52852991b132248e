import type { Task } from 'graphile-worker';
import type { Desk } from '@/server/services/desk';
import { expireClaims } from '@/server/services/expire-claims';
import { refineMissing } from '@/server/services/refine-missing';

/**
 * The job that ends claims whose time is over, lets go of private checks a week after they were asked for, and has
 * entries refined that were left out.
 */
export function tidyUp(desk: Desk): Task {
  return async () => {
    await expireClaims(desk);
    await desk.db.query('select expire_checks()');
    await refineMissing(desk.db);
  };
}
