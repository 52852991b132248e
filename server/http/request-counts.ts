import type { RequestHandler } from 'express';

/** How many requests were answered, by hundreds of their status, since the process began. */
export class RequestCounts {
  readonly byClass = new Map<string, number>();

  readonly count: RequestHandler = (_req, res, next) => {
    res.on('finish', () => {
      const name = `${String(res.statusCode)[0]!}xx`;
      this.byClass.set(name, (this.byClass.get(name) ?? 0) + 1);
    });
    next();
  };
}
