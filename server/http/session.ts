import connectPgSimple from 'connect-pg-simple';
import type { RequestHandler } from 'express';
import session from 'express-session';
import type { AppDependencies } from '@/server/app-dependencies';
import { SESSION_COOKIE } from '@/server/http/session-cookie';

/** How long a sign-in lasts: fourteen days. */
const SESSION_SECONDS = 1_209_600;
/** Expired sign-ins are cleared this often, in seconds. */
const PRUNE_SECONDS = 900;

const Store = connectPgSimple(session);

/** Sign-ins live in PostgreSQL, so any number of servers share them; the browser holds a random, signed id only. */
export function signInSessions({ config, pool, log }: AppDependencies): RequestHandler[] {
  const secure = config.publicUrl.startsWith('https:');
  const sessions = session({
    name: SESSION_COOKIE,
    secret: config.sessionSecret,
    resave: false,
    saveUninitialized: false,
    proxy: secure,
    cookie: { httpOnly: true, sameSite: 'lax', secure, maxAge: SESSION_SECONDS * 1000 },
    store: new Store({
      pool,
      tableName: 'session',
      // A sign-in ends when its cookie does; renewing it would write to the database on every read.
      disableTouch: true,
      pruneSessionInterval: config.logLevel === 'silent' ? false : PRUNE_SECONDS,
      errorLog: (...said: unknown[]) => log.warn({ said }, 'session store'),
    }),
  });
  return secure ? [assumeHttps, sessions] : [sessions];
}

/** PUBLIC_URL says that people come through https, whether or not the proxy forwards the fact. */
const assumeHttps: RequestHandler = (req, _res, next) => {
  req.headers['x-forwarded-proto'] ??= 'https';
  next();
};
