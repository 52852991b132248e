import type { Request, RequestHandler } from 'express';
import { Problem } from '@/server/errors';
import { guardJson } from '@/server/http/guard-json';
import { keepTypedDigits } from '@/server/http/keep-typed-digits';
import { scanJson } from '@/server/http/scan-json';

/** Largest JSON body. */
export const MAX_BODY_BYTES = 1_048_576;
/** A longer body is read and dropped up to here, so that its sender hears the answer; beyond, the line is cut. */
const MAX_DROPPED_BYTES = 67_108_864;

const BODY_TYPE = /^application\/json\s*(?:;\s*charset\s*=\s*"?utf-?8"?\s*)?$/i;

/** Read a JSON body into `req.body`; it stays undefined when the request has none. */
export function readBody(): RequestHandler {
  return async (req, _res, next) => {
    if (!hasBody(req)) {
      next();
      return;
    }
    const wrongType = typeProblem(req);
    const bytes = await readBytes(req, wrongType ? 0 : MAX_BODY_BYTES);
    if (wrongType) throw wrongType;
    if (bytes === null) {
      throw new Problem(
        'body-too-large',
        `The body is larger than ${MAX_BODY_BYTES} bytes (1 MB), the limit for JSON.`,
      );
    }
    if (bytes.length > 0) req.body = parseBody(bytes);
    next();
  };
}

function hasBody(req: Request): boolean {
  const length = req.headers['content-length'];
  return req.headers['transfer-encoding'] !== undefined || (length !== undefined && length !== '0');
}

function typeProblem(req: Request): Problem | null {
  const type = req.headers['content-type'] ?? 'none';
  if (!BODY_TYPE.test(type.trim())) {
    return new Problem(
      'unsupported-media-type',
      `Send application/json in UTF-8; the content type was "${type.slice(0, 100)}".`,
    );
  }
  const encoding = req.headers['content-encoding'] ?? 'identity';
  return encoding === 'identity'
    ? null
    : new Problem('unsupported-media-type', 'Send the body without content encoding.');
}

/** The whole body, or null when it is longer than the limit; it is read to its end either way. */
function readBytes(req: Request, limit: number): Promise<Buffer | null> {
  return new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    let size = 0;
    req.on('data', (chunk: Buffer) => {
      size += chunk.length;
      if (size <= limit) chunks.push(chunk);
      else chunks.length = 0;
      if (size > MAX_DROPPED_BYTES) req.destroy();
    });
    req.on('end', () => resolve(size <= limit ? Buffer.concat(chunks) : null));
    req.on('error', reject);
    req.on('close', () => {
      if (!req.complete) reject(new Problem('malformed-json', 'The connection ended before the body did.'));
    });
  });
}

function parseBody(bytes: Buffer): unknown {
  const text = decode(bytes);
  if (text.trim() === '') return undefined;
  const wrongAt = scanJson(text);
  if (wrongAt !== null) throw malformed(text, wrongAt);
  const body: unknown = JSON.parse(keepTypedDigits(text));
  guardJson(body);
  return body;
}

function decode(bytes: Buffer): string {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new Problem('malformed-json', 'The body is not valid UTF-8.');
  }
}

function malformed(text: string, at: number): Problem {
  const before = text.slice(0, at).split('\n');
  const place = `line ${before.length}, column ${before.at(-1)!.length + 1}`;
  const what =
    at >= text.length
      ? 'it ends too early'
      : `unexpected ${JSON.stringify(String.fromCodePoint(text.codePointAt(at) ?? 0))}`;
  const message = `The body is not JSON: ${what} at ${place} (character ${at + 1}).`;
  return new Problem('malformed-json', message, { errors: [{ pointer: '', message, position: at + 1 }] });
}
