import { invalidQuery } from '@/server/errors';

/**
 * Which revision of an entry is asked for; null: the current one.
 *
 * @throws {Problem} `invalid-query` at `#revision`.
 */
export function readRevision({ revision }: Readonly<Record<string, unknown>>): number | null {
  if (revision === undefined) return null;
  if (typeof revision === 'string' && /^[1-9][0-9]{0,5}$/.test(revision)) return parseInt(revision, 10);
  throw invalidQuery([
    { pointer: '#revision', message: 'revision is a whole number from 1, as /revisions lists them.' },
  ]);
}
