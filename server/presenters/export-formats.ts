import { createHash } from 'node:crypto';
import type { ExportEnd } from '@/schemas/generated/contract';
import { CAUTION } from '@/server/caution';
import { presentEntry } from '@/server/presenters/entry';
import { entryTable } from '@/server/presenters/entry-csv';
import type { OrbitExport } from '@/server/services/export-orbits';

export type ExportFormat = 'json' | 'ndjson' | 'csv';

interface Format {
  type: string;
  /** The export piece by piece; no piece is larger than an entry. */
  pieces: (found: OrbitExport) => AsyncGenerator<string>;
}

export const exportFormats: Readonly<Record<ExportFormat, Format>> = {
  json: { type: 'application/json; charset=utf-8', pieces: jsonPieces },
  ndjson: { type: 'application/x-ndjson; charset=utf-8', pieces: ndjsonPieces },
  csv: { type: 'text/csv; charset=utf-8; header=present', pieces: csvPieces },
};

/** One document: `EntryExport` of the contract. */
async function* jsonPieces({ rows }: OrbitExport): AsyncGenerator<string> {
  yield `{"caution":${JSON.stringify(CAUTION)},"items":[`;
  let total = 0;
  for await (const row of rows) {
    yield `${total === 0 ? '' : ','}\n${JSON.stringify(presentEntry(row))}`;
    total += 1;
  }
  yield `\n],"total":${total}}\n`;
}

/** One entry a line, then a line with the count and the SHA-256 of everything before it. */
async function* ndjsonPieces({ rows }: OrbitExport): AsyncGenerator<string> {
  const hash = createHash('sha256');
  let count = 0;
  for await (const row of rows) {
    const line = `${JSON.stringify(presentEntry(row))}\n`;
    hash.update(line);
    count += 1;
    yield line;
  }
  const end: ExportEnd = { end: true, count, sha256: hash.digest('hex') };
  yield `${JSON.stringify(end)}\n`;
}

async function* csvPieces({ shape, rows }: OrbitExport): AsyncGenerator<string> {
  const table = entryTable(shape);
  yield table.header;
  for await (const row of rows) yield table.record(presentEntry(row));
}
