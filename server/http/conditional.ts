import { createHash } from 'node:crypto';
import type { Request, Response } from 'express';
import type { Problem as ProblemBody } from '@/schemas/generated/contract';
import { preconditionFailed, preconditionRequired } from '@/server/errors';

/** Characters of a hash that an ETag keeps: 144 bits. */
const ETAG_LENGTH = 24;

/** A strong ETag of whatever decides how an answer reads. */
export function strongEtag(...parts: readonly (string | number | null)[]): string {
  const hash = createHash('sha256').update(JSON.stringify(parts)).digest('base64url');
  return `"${hash.slice(0, ETAG_LENGTH)}"`;
}

/** Answer JSON under its ETag; 304 without a body when the client has this very version. */
export function answerWithEtag(req: Request, res: Response, answer: { etag: string; body: unknown }): void {
  res.set({ ETag: answer.etag, 'Cache-Control': 'private, no-cache' });
  res.vary('Cookie');
  if (matchesEtag(req.headers['if-none-match'], answer.etag, 'weak')) res.status(304).end();
  else res.json(answer.body);
}

/**
 * Whether a list of ETags (RFC 9110, 13.1) holds this one; `*` holds every one.
 *
 * A strong comparison, as If-Match asks for, never matches a weak tag; If-None-Match compares weakly.
 */
export function matchesEtag(
  header: string | undefined,
  etag: string,
  comparison: 'strong' | 'weak' = 'strong',
): boolean {
  if (header === undefined) return false;
  if (header.trim() === '*') return true;
  const given = header.match(/(?:W\/)?"[^"]*"/g) ?? [];
  return given.some((tag) => tag === etag || (comparison === 'weak' && tag === `W/${etag}`));
}

/**
 * The `If-Match` header of a change.
 *
 * @throws {Problem} 428 when there is none. Test rights before.
 */
export function ifMatchOf(req: Request): string {
  const header = req.headers['if-match'];
  if (header === undefined) throw preconditionRequired();
  return header;
}

/**
 * Insist that the client has seen the current version.
 *
 * @throws {Problem} 428 without `If-Match`, 412 with what happened meanwhile when it names another version.
 */
export function requireMatch(req: Request, etag: string, meanwhile: ProblemBody['meanwhile'] = null): void {
  if (!matchesEtag(ifMatchOf(req), etag)) throw preconditionFailed(meanwhile);
}
