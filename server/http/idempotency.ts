import { createHash } from 'node:crypto';
import type { Request, RequestHandler, Response } from 'express';
import { QueryTypes, type Sequelize } from 'sequelize';
import { invalidHeader, Problem } from '@/server/errors';
import { userOf } from '@/server/http/current-user';
import { addressOf } from '@/server/http/rate-limits';

const KEY = /^[\x21-\x7e]{1,200}$/;
/** A request that has not answered by then died with its server, and its key is free again. */
const ABANDONED = '2 minutes';
/** How long an answer is kept. */
const KEPT = '24 hours';
const RETRY_SECONDS = '1';
/** Headers that belong to an answer as much as its body. */
const KEPT_HEADERS = ['location', 'etag'];

interface KeptAnswer {
  request_hash: string;
  status: number | null;
  headers: Record<string, string> | null;
  body: string | null;
}

interface Slot {
  owner: string;
  key: string;
  requestHash: string;
}

/**
 * Honour `Idempotency-Key` on a call that creates: a repeated request gets the first one's answer and creates nothing.
 *
 * Put it after rights and validation. Keys belong to the account, or to the address of somebody without one. Only
 * successful answers are kept: a refused request may be repeated under its key.
 */
export function idempotent(db: Sequelize): RequestHandler {
  return async (req, res, next) => {
    const key = req.headers['idempotency-key'];
    if (key === undefined) {
      next();
      return;
    }
    if (typeof key !== 'string' || !KEY.test(key)) {
      throw invalidHeader('Idempotency-Key', 'Idempotency-Key takes 1 to 200 visible ASCII characters.');
    }
    const slot: Slot = { owner: ownerOf(req), key, requestHash: requestHash(req) };
    const kept = await take(db, slot);
    if (kept) {
      replay(res, kept, slot);
      return;
    }
    keepAnswer(db, res, slot);
    next();
  };
}

const ownerOf = (req: Request): string => userOf(req)?.id ?? `address ${addressOf(req)}`;

const requestHash = (req: Request): string =>
  createHash('sha256')
    .update(JSON.stringify([req.method, req.originalUrl, req.body ?? null]))
    .digest('hex');

/** Take the key for this request; null on success, else what holds it. */
async function take(db: Sequelize, { owner, key, requestHash: hash }: Slot): Promise<KeptAnswer | null> {
  await db.query(
    `delete from idempotency_key
     where created_at < now() - $1::interval or (status is null and created_at < now() - $2::interval)`,
    { bind: [KEPT, ABANDONED] },
  );
  const taken = await db.query(
    `insert into idempotency_key (owner, key, request_hash) values ($1, $2, $3)
     on conflict (owner, key) do nothing returning key`,
    { bind: [owner, key, hash], type: QueryTypes.SELECT },
  );
  if (taken.length > 0) return null;
  const [kept] = await db.query<KeptAnswer>(
    'select request_hash, status, headers, body from idempotency_key where owner = $1 and key = $2',
    { bind: [owner, key], type: QueryTypes.SELECT },
  );
  return kept ?? { request_hash: hash, status: null, headers: null, body: null };
}

function replay(res: Response, kept: KeptAnswer, slot: Slot): void {
  if (kept.request_hash !== slot.requestHash) {
    throw new Problem('idempotency-key-reused', 'This Idempotency-Key was used for another request. Use a new one.');
  }
  if (kept.status === null) {
    throw new Problem(
      'request-in-progress',
      'The first request with this Idempotency-Key is being worked on. Try again.',
      {
        headers: { 'Retry-After': RETRY_SECONDS },
      },
    );
  }
  res.status(kept.status).set({ ...kept.headers, 'Idempotency-Replayed': 'true' });
  if (kept.body === null) res.end();
  else res.type('application/json').send(kept.body);
}

/** Store the answer before it is sent; free the key when there is none worth keeping. */
function keepAnswer(db: Sequelize, res: Response, { owner, key }: Slot): void {
  let stored = false;
  const send = res.send.bind(res);
  res.send = (body?: unknown) => {
    // `res.json` calls `res.send` with the text; only the first call is the answer.
    if (stored || res.statusCode >= 300 || (typeof body !== 'string' && body !== undefined)) return send(body);
    stored = true;
    const headers = Object.fromEntries(
      KEPT_HEADERS.flatMap((name) => (res.getHeader(name) === undefined ? [] : [[name, String(res.getHeader(name))]])),
    );
    db.query('update idempotency_key set status = $3, headers = $4, body = $5 where owner = $1 and key = $2', {
      bind: [owner, key, res.statusCode, JSON.stringify(headers), body ?? null],
    }).then(
      () => send(body),
      () => send(body),
    );
    return res;
  };
  res.on('close', () => {
    if (stored) return;
    // Nobody waits for this; a key that stays taken is freed after a while.
    db.query('delete from idempotency_key where owner = $1 and key = $2 and status is null', {
      bind: [owner, key],
    }).catch(() => undefined);
  });
}
