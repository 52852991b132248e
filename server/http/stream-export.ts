import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { Response } from 'express';
import { tooMany } from '@/server/errors';
import { type ExportFormat, exportFormats } from '@/server/presenters/export-formats';
import type { OrbitExport } from '@/server/services/export-orbits';

/** Exports that one server streams at a time; each holds a connection to the database. */
const MAX_EXPORTS = 4;
const RETRY_SECONDS = 10;

/** Lets so many exports run at a time and refuses the rest with 429. */
export class ExportGate {
  private running = 0;

  async pass(work: () => Promise<void>): Promise<void> {
    if (this.running >= MAX_EXPORTS) {
      throw tooMany('too-many-requests', `${MAX_EXPORTS} exports run at the moment, the limit.`, RETRY_SECONDS);
    }
    this.running += 1;
    try {
      await work();
    } finally {
      this.running -= 1;
    }
  }
}

/** Send an export as fast as its reader takes it. When the reader leaves, the work behind it stops as well. */
export async function streamExport(
  res: Response,
  found: OrbitExport,
  { format, system }: { format: ExportFormat; system: string | null },
): Promise<void> {
  const { type } = exportFormats[format];
  const day = new Date().toISOString().slice(0, 'yyyy-mm-dd'.length);
  res.set({
    'Content-Type': type,
    'Content-Disposition': `attachment; filename="ritornel-${system ?? 'orbits'}-${day}.${format}"`,
    'Cache-Control': 'no-store',
  });
  try {
    await pipeline(Readable.from(exportFormats[format].pieces(found), { objectMode: false }), res);
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  }
}
