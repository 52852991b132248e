import type { Request, Response } from 'express';

/** Say in `Link` (RFC 8288) where the next page is: the whole address of this one with another `after`. */
export function linkNext(req: Request, res: Response, next: string | null): void {
  if (next === null) return;
  const address = new URL(req.originalUrl, `${req.protocol}://${req.get('host') ?? 'localhost'}`);
  address.searchParams.set('after', next);
  res.append('Link', `<${address.href}>; rel="next"`);
}
