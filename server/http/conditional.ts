import { createHash } from 'node:crypto';
import type { Request, Response } from 'express';

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
  if (matchesEtag(req.headers['if-none-match'], answer.etag)) res.status(304).end();
  else res.json(answer.body);
}

/** Whether `If-None-Match` (RFC 9110, 13.1.2) holds this ETag; it compares weakly, and `*` holds every one. */
function matchesEtag(header: string | undefined, etag: string): boolean {
  if (header === undefined) return false;
  if (header.trim() === '*') return true;
  return (header.match(/(?:W\/)?"[^"]*"/g) ?? []).some((tag) => tag.replace(/^W\//, '') === etag);
}
