import type { Task } from 'graphile-worker';
import type { Pool } from 'pg';
import type { Log } from '@/server/log';
import { csvLine } from '@/server/presenters/csv-line';
import { dataPackage } from '@/server/presenters/data-package';
import { entryTable } from '@/server/presenters/entry-csv';
import { exportFormats } from '@/server/presenters/export-formats';
import { TRIES } from '@/server/services/check-limits';
import { cutRelease, type EntriesFile, type EntryChange, failRelease } from '@/server/services/cut-release';

const entries: readonly EntriesFile[] = [
  { name: 'orbits.ndjson.gz', mediaType: 'application/x-ndjson', pieces: exportFormats.ndjson.pieces },
  { name: 'orbits.csv.gz', mediaType: 'text/csv', pieces: exportFormats.csv.pieces },
];

async function* changesTable(changes: AsyncIterable<EntryChange>): AsyncGenerator<string> {
  yield csvLine(['accession', 'change', 'revision', 'previousRevision']);
  for await (const { accession, change, revision, previous_revision } of changes) {
    yield csvLine([accession, change, revision, previous_revision]);
  }
}

const LONGEST_MESSAGE = 300;

/** The job that cuts a release of the catalogue and describes it as a data package. */
export function cutReleaseJob({ pool, publicUrl, log }: { pool: Pool; publicUrl: string; log: Log }): Task {
  return async (payload, { job }) => {
    const { release } = payload as { release: number };
    try {
      await cutRelease(pool, release, {
        entries,
        changes: { name: 'changes.csv', mediaType: 'text/csv', pieces: changesTable },
        descriptor: {
          name: 'datapackage.json',
          mediaType: 'application/json',
          text: (files, shape) => {
            const described = files.map(({ name, ...file }) => ({
              ...{ ...file, name: name.replace(/\.gz$/, ''), path: name },
              ...(name === 'orbits.csv.gz' && { fields: entryTable(shape).fields }),
            }));
            const title = `Ritornel, release ${release}`;
            const homepage = `${publicUrl}/releases/${release}`;
            const name = `ritornel-release-${release}`;
            return `${JSON.stringify(dataPackage({ name, title, homepage, created: new Date(), files: described }), null, 2)}\n`;
          },
        },
      });
    } catch (error) {
      log.error({ err: error, release }, 'a release could not be cut');
      if (job.attempts < TRIES) throw error;
      const message = error instanceof Error ? error.message : String(error);
      await failRelease(pool, release, message.slice(0, LONGEST_MESSAGE));
    }
  };
}
