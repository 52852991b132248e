import type { Request } from 'express';
import type { Pool } from 'pg';
import { RateLimiterPostgres, RateLimiterRes } from 'rate-limiter-flexible';
import { tooMany } from '@/server/errors';

const QUARTER_HOUR = 900;
const HOUR = 3600;

/** Failed sign-ins of one account from one address, in a quarter of an hour. */
const MAX_FAILED_PER_ACCOUNT_AND_ADDRESS = 10;
/** Failed sign-ins of one account from anywhere, in a quarter of an hour. */
const MAX_FAILED_PER_ACCOUNT = 60;
/** Failed sign-ins from one address, in a quarter of an hour. */
const MAX_FAILED_PER_ADDRESS = 100;
/** Requests from one address that may send a mail, in an hour. */
const MAX_MAIL_REQUESTS = 120;

export interface RateLimits {
  /** Run a sign-in; when it fails, it counts against address and account. */
  signIn<T>(attempt: { address: string; account: string }, run: () => Promise<T>): Promise<T>;
  /** Count a request that may send a mail. */
  mailRequest(address: string): Promise<void>;
}

/** Limits that every server shares, kept in PostgreSQL. */
export function rateLimits(pool: Pool): RateLimits {
  const limiter = (keyPrefix: string, points: number, duration: number): RateLimiterPostgres =>
    new RateLimiterPostgres({
      storeClient: pool,
      tableName: 'rate_limit',
      tableCreated: true,
      keyPrefix,
      points,
      duration,
    });
  const perPair = limiter('sign-in-pair', MAX_FAILED_PER_ACCOUNT_AND_ADDRESS, QUARTER_HOUR);
  const perAccount = limiter('sign-in-account', MAX_FAILED_PER_ACCOUNT, QUARTER_HOUR);
  const perAddress = limiter('sign-in-address', MAX_FAILED_PER_ADDRESS, QUARTER_HOUR);
  const mails = limiter('mail', MAX_MAIL_REQUESTS, HOUR);

  return {
    async signIn({ address, account }, run) {
      const counted: [RateLimiterPostgres, string][] = [
        [perPair, `${account} ${address}`],
        [perAccount, account],
        [perAddress, address],
      ];
      // Counted before the password is looked at, so that attempts at the same time count too.
      for (const [limit, key] of counted) await consume(limit, key, 'too-many-sign-ins');
      const result = await run();
      for (const [limit, key] of counted) await limit.reward(key);
      return result;
    },
    mailRequest: (address) => consume(mails, address, 'too-many-requests'),
  };
}

async function consume(
  limit: RateLimiterPostgres,
  key: string,
  code: 'too-many-sign-ins' | 'too-many-requests',
): Promise<void> {
  try {
    await limit.consume(key);
  } catch (refused) {
    if (!(refused instanceof RateLimiterRes)) throw refused;
    const seconds = Math.ceil(refused.msBeforeNext / 1000);
    const what = code === 'too-many-sign-ins' ? 'failed sign-ins' : 'requests';
    throw tooMany(
      code,
      `Too many ${what}: ${limit.points} in ${limit.duration / 60} minutes are the limit. Try again in ${seconds} s.`,
      seconds,
    );
  }
}

/** The address that limits count by. */
export const addressOf = (req: Request): string => req.ip ?? 'unknown';
