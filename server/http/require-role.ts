import type { Request, RequestHandler } from 'express';
import type { Role } from '@/schemas/generated/contract';
import { notAllowed, notSignedIn, sessionExpired } from '@/server/errors';
import { userOf } from '@/server/http/current-user';
import { carriesSessionCookie } from '@/server/http/session-cookie';
import type { User } from '@/server/models/user';

/** Each role includes those before it. */
const ladder: readonly Role[] = ['reader', 'contributor', 'curator', 'administrator'];

export const hasRole = (user: Pick<User, 'role'>, role: Role): boolean =>
  ladder.indexOf(user.role) >= ladder.indexOf(role);

/** Let signed-in people through; others get 401, which says whether a sign-in has expired. */
export const requireSignedIn: RequestHandler = (req, _res, next) => {
  signedInUser(req);
  next();
};

/** Let people through whose role is this one or above. */
export function requireRole(role: Role): RequestHandler {
  return (req, _res, next) => {
    if (!hasRole(signedInUser(req), role)) throw notAllowed(role);
    next();
  };
}

/**
 * The account behind a request that passed `requireSignedIn` or `requireRole`.
 *
 * @throws {Problem} 401 when nobody is signed in.
 */
export function signedInUser(req: Request): User {
  const user = userOf(req);
  if (!user) throw carriesSessionCookie(req) ? sessionExpired() : notSignedIn();
  return user;
}
