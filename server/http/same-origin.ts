import type { Request, RequestHandler } from 'express';
import { Problem } from '@/server/errors';
import { carriesSessionCookie } from '@/server/http/session-cookie';

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS']);
const OWN_SITES = new Set(['same-origin', 'none']);

/**
 * Refuse a state-changing request that carries the sign-in cookie and comes from another site: `Sec-Fetch-Site` says
 * so, or the host of `Origin` is neither the request's nor `publicUrl`'s. With neither header it passes.
 */
export function sameOriginOnly(publicUrl: string): RequestHandler {
  const publicHost = new URL(publicUrl).host;
  return (req, _res, next) => {
    if (!SAFE_METHODS.has(req.method) && carriesSessionCookie(req) && isForeign(req, publicHost)) {
      throw new Problem('cross-site', 'A signed-in change has to come from this site itself. Nothing was changed.');
    }
    next();
  };
}

function isForeign(req: Request, publicHost: string): boolean {
  const site = req.headers['sec-fetch-site'];
  if (typeof site === 'string' && !OWN_SITES.has(site)) return true;
  const { origin, host } = req.headers;
  if (origin === undefined) return false;
  if (!URL.canParse(origin)) return true;
  return ![host, publicHost].includes(new URL(origin).host);
}
