import { createHmac } from 'node:crypto';
import type { Request } from 'express';
import { userOf } from '@/server/http/current-user';
import { addressOf } from '@/server/http/rate-limits';
import type { Requester } from '@/server/services/allow-check';

/** Whose computing time a request uses: the account's, else the address's, of which only a keyed hash is kept. */
export function requesterOf(req: Request, secret: string): Requester {
  const user = userOf(req);
  if (user) return { accountId: user.id };
  return {
    addressHash: createHmac('sha256', secret)
      .update(`address ${addressOf(req)}`)
      .digest('hex'),
  };
}
