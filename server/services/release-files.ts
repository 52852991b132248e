import { createHash } from 'node:crypto';
import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { createGzip } from 'node:zlib';
import type { Pool, PoolClient } from 'pg';

/** Bytes of a file that are read or written at a time. */
const PART_BYTES = 1024 * 1024;

export interface StoredFile {
  name: string;
  mediaType: string;
  bytes: number;
  sha256: string;
}

interface WrittenFile {
  releaseId: number;
  name: string;
  mediaType: string;
  pieces: AsyncIterable<string> | Iterable<string>;
}

/** Keep one file of a release, piece by piece; a name that ends in `.gz` is compressed. */
export async function writeReleaseFile(client: PoolClient, file: WrittenFile): Promise<StoredFile> {
  const { releaseId, name, mediaType } = file;
  const hash = createHash('sha256');
  let bytes = 0;
  let position = 0;
  for await (const part of inParts(bytesOf(file))) {
    hash.update(part);
    bytes += part.length;
    position += 1;
    await client.query('insert into release_part (release_id, name, position, content) values ($1, $2, $3, $4)', [
      ...[releaseId, name, position, part],
    ]);
  }
  const sha256 = hash.digest('hex');
  await client.query(
    'insert into release_file (release_id, name, media_type, bytes, sha256) values ($1, $2, $3, $4, $5)',
    [...[releaseId, name, mediaType, bytes, sha256]],
  );
  return { name, mediaType, bytes, sha256 };
}

async function* bytesOf({ name, pieces }: WrittenFile): AsyncGenerator<Buffer> {
  const text = Readable.from(pieces, { objectMode: false });
  if (!name.endsWith('.gz')) {
    yield* text as AsyncIterable<Buffer>;
    return;
  }
  const gzip = createGzip();
  const done = pipeline(text, gzip);
  // Its failure is met below; without this it would count as nobody's.
  done.catch(() => undefined);
  yield* gzip as AsyncIterable<Buffer>;
  await done;
}

async function* inParts(chunks: AsyncIterable<Buffer>): AsyncGenerator<Buffer> {
  let waiting: Buffer[] = [];
  let size = 0;
  for await (const chunk of chunks) {
    waiting.push(chunk);
    size += chunk.length;
    if (size < PART_BYTES) continue;
    yield Buffer.concat(waiting);
    waiting = [];
    size = 0;
  }
  if (size > 0) yield Buffer.concat(waiting);
}

/** A file of a release that is ready; null where there is none of this name. */
export async function findReleaseFile(pool: Pool, releaseId: number, name: string): Promise<StoredFile | null> {
  const { rows } = await pool.query<StoredFile>(
    `select f.name, f.media_type as "mediaType", f.bytes::float8 as bytes, f.sha256
     from release_file f join release r on r.id = f.release_id
     where f.release_id = $1 and f.name = $2 and r.state = 'ready'`,
    [releaseId, name],
  );
  return rows[0] ?? null;
}

/** The bytes of a file, a part at a time. */
export async function* readReleaseFile(pool: Pool, releaseId: number, name: string): AsyncGenerator<Buffer> {
  for (let position = 1; ; position += 1) {
    const { rows } = await pool.query<{ content: Buffer }>(
      'select content from release_part where release_id = $1 and name = $2 and position = $3',
      [releaseId, name, position],
    );
    if (!rows[0]) return;
    yield rows[0].content;
  }
}
