import type { Request, Response } from 'express';

/** Longest wait that is honoured, in seconds. */
const MAX_WAIT_SECONDS = 60;

const WAIT = /(?:^|[,;\s])wait\s*=\s*"?([0-9]{1,9})"?(?=\s*(?:[,;]|$))/i;

/** How long the client prefers to wait for the result (RFC 7240), in seconds; says so when it is honoured. */
export function preferredWait(req: Request, res: Response): number {
  const [, typed] = WAIT.exec(req.get('Prefer') ?? '') ?? [];
  if (typed === undefined) return 0;
  const seconds = Math.min(parseInt(typed, 10), MAX_WAIT_SECONDS);
  res.set('Preference-Applied', `wait=${seconds}`);
  return seconds;
}
