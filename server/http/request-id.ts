import { randomUUID } from 'node:crypto';
import type { IncomingMessage } from 'node:http';
import type { RequestHandler } from 'express';

const ids = new WeakMap<IncomingMessage, string>();

/** Give every request a random id, sent back in `X-Request-Id` and written in every log line about it. */
export const withRequestId: RequestHandler = (req, res, next) => {
  const id = randomUUID();
  ids.set(req, id);
  res.set('X-Request-Id', id);
  next();
};

export const requestIdOf = (req: IncomingMessage): string | null => ids.get(req) ?? null;
