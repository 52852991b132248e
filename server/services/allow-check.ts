import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import { tooMany } from '@/server/errors';
import {
  CHECKS_AT_ONCE,
  CHECKS_AT_ONCE_WITHOUT_ACCOUNT,
  COMPUTING,
  COMPUTING_WITHOUT_ACCOUNT,
} from '@/server/services/check-limits';

/** Somebody who wants something computed: an account, or an address by its keyed hash. */
export type Requester = { accountId: string } | { addressHash: string };

/** Seconds after which a waiting check has a good chance to be done. */
const RETRY_SECONDS = 2;

/**
 * Refuse a computation to somebody who has too many under way or has used up the computing time; checks and
 * refinements count alike.
 *
 * Requests of one requester wait for each other here until their transactions end, so that none slips past the count.
 *
 * @throws {Problem} `too-many-checks` or `computing-time-used`, with `Retry-After`.
 */
export async function allowCheck(db: Sequelize, requester: Requester, transaction: Transaction): Promise<void> {
  const isAccount = 'accountId' in requester;
  const who = isAccount ? requester.accountId : requester.addressHash;
  const atOnce = isAccount ? CHECKS_AT_ONCE : CHECKS_AT_ONCE_WITHOUT_ACCOUNT;
  const computing = isAccount ? COMPUTING : COMPUTING_WITHOUT_ACCOUNT;
  await db.query('select pg_advisory_xact_lock(hashtextextended($1, 1))', { bind: [who], transaction });
  const column = isAccount ? 'owner_id' : 'address_hash';
  const [used] = await db.query<{ waiting: number; used: boolean; oldest: number | null }>(
    `select count(*) filter (where finished_at is null and submission_id is null)::integer as waiting,
       coalesce(sum(compute_ms), 0) >= $3 * 1000 as used,
       extract(epoch from min(finished_at) filter (where compute_ms > 0) - now())::float8 as oldest
     from (select submission_id, finished_at, compute_ms from orbit_check where ${column} = $1
       ${isAccount ? 'union all select null, finished_at, compute_ms from refinement where asked_by = $1' : ''}) as asked
     where finished_at is null or finished_at > now() - make_interval(secs => $2)`,
    { bind: [who, computing.windowSeconds, computing.seconds], type: QueryTypes.SELECT, transaction },
  );
  if (used!.waiting >= atOnce) {
    throw tooMany(
      'too-many-checks',
      `${used!.waiting} of your checks${isAccount ? ' and refinements' : ''} wait or run; the limit is ${atOnce} at once${isAccount ? '' : ' without an account'}.`,
      RETRY_SECONDS,
    );
  }
  if (used!.used) {
    const { seconds, windowSeconds } = computing;
    throw tooMany(
      'computing-time-used',
      `Your checks${isAccount ? ' and refinements' : ''} have computed for ${seconds} s within ${windowSeconds} s, which is the limit${isAccount ? '' : ' without an account'}.`,
      windowSeconds + (used!.oldest ?? 0),
    );
  }
}
