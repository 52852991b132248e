import { type Request, type Response, Router } from 'express';
import type { Session, SessionChange, SignIn as SignInBody } from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { userOf } from '@/server/http/current-user';
import { addressOf, type RateLimits } from '@/server/http/rate-limits';
import { requireRole, signedInUser } from '@/server/http/require-role';
import { SESSION_COOKIE } from '@/server/http/session-cookie';
import type { SignIn } from '@/server/http/sign-in-strategy';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { User } from '@/server/models/user';
import { presentUser } from '@/server/presenters/user';
import { countWaiting } from '@/server/services/count-waiting';
import { isCurator } from '@/server/services/find-submission';

interface SessionParts {
  signIn: SignIn;
  limits: RateLimits;
}

/** Who am I, sign in, sign out. */
export function sessionRoutes({ config, db }: AppDependencies, { signIn, limits }: SessionParts): Router {
  const router = Router();

  const session = async (req: Request): Promise<Session> => {
    const user = userOf(req);
    return {
      user: user && presentUser(user),
      waiting: user ? await countWaiting(db, user) : 0,
      digest: user && isCurator(user) ? user.digest : null,
      development: !config.production && config.smtpUrl === null,
    };
  };

  router.get('/session', async (req, res) => {
    res.set('Cache-Control', 'no-store').json(await session(req));
  });

  router.post('/session', validBody('sign-in'), async (req, res) => {
    const account = bodyOf<SignInBody>(req).email.trim().toLowerCase();
    await limits.signIn({ address: addressOf(req), account }, () => begin(signIn, req, res));
    res.set('Cache-Control', 'no-store').json(await session(req));
  });

  router.patch('/session', requireRole('curator'), validBody('session-change'), async (req, res) => {
    const { id } = signedInUser(req);
    const { digest } = bodyOf<SessionChange>(req);
    await User.update({ digest }, { where: { id } });
    res.set('Cache-Control', 'no-store').json({ ...(await session(req)), digest });
  });

  router.delete('/session', async (req, res) => {
    await end(req);
    res.clearCookie(SESSION_COOKIE, { httpOnly: true, sameSite: 'lax', path: '/' }).status(204).end();
  });

  return router;
}

/** Passport ends the old session and begins a new one, so that an id planted before is worth nothing. */
const begin = (signIn: SignIn, req: Request, res: Response): Promise<void> =>
  new Promise((resolve, reject) => {
    signIn.begin(req, res, (error?: Error | 'route' | 'router') =>
      error instanceof Error ? reject(error) : resolve(),
    );
  });

const end = (req: Request): Promise<void> =>
  new Promise((resolve, reject) => {
    req.session.destroy((error?: Error) => (error ? reject(error) : resolve()));
  });
