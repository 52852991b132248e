import type { IncomingMessage } from 'node:http';

/** Name of the sign-in cookie. */
export const SESSION_COOKIE = 'ritornel.sign-in';

/** Whether the request carries a sign-in cookie, good or not. */
export const carriesSessionCookie = (req: IncomingMessage): boolean =>
  (req.headers.cookie ?? '').split(';').some((pair) => pair.trim().startsWith(`${SESSION_COOKIE}=`));
