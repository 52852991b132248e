import type { Request } from 'express';
import { notFound } from '@/server/errors';

const UUID = /^[0-9a-f]{8}-(?:[0-9a-f]{4}-){3}[0-9a-f]{12}$/i;

/**
 * The id in an address.
 *
 * @throws {Problem} 404 when it cannot be anybody's id.
 */
export function idParameter(req: Request, what: string): string {
  const id = String(req.params['id']);
  if (!UUID.test(id)) throw notFound(what);
  return id.toLowerCase();
}
