import { type Request, type Response, Router } from 'express';
import type { Session, SignIn as SignInBody } from '@/schemas/generated/contract';
import type { AppDependencies } from '@/server/app-dependencies';
import { userOf } from '@/server/http/current-user';
import { addressOf, type RateLimits } from '@/server/http/rate-limits';
import { SESSION_COOKIE } from '@/server/http/session-cookie';
import type { SignIn } from '@/server/http/sign-in-strategy';
import { bodyOf, validBody } from '@/server/http/valid-body';
import { presentUser } from '@/server/presenters/user';
import { countWaiting } from '@/server/services/count-waiting';

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
