import { CAUTION, LICENCE } from '@/server/caution';
import type { EntryTable } from '@/server/presenters/entry-csv';
import { LICENCE_ADDRESS } from '@/server/presenters/head/page-head';

interface DataFile {
  /** Lower-case letters, digits, dots and hyphens. */
  name: string;
  /** Beside the descriptor, or a whole address. */
  path: string;
  mediaType: string;
  /** Columns, where it is a table. */
  fields?: EntryTable['fields'];
  bytes?: number;
  sha256?: string;
}

interface DataPackage {
  name: string;
  title: string;
  homepage: string;
  created: Date;
  files: readonly DataFile[];
}

/** A Frictionless Data Package descriptor: what the files are, whose, under which licence, and their columns. */
export const dataPackage = ({ name, title, homepage, created, files }: DataPackage): object => ({
  profile: 'data-package',
  name,
  title,
  description: CAUTION,
  homepage,
  created: created.toISOString(),
  licenses: [{ name: LICENCE, path: LICENCE_ADDRESS }],
  resources: files.map(({ name: resource, path, mediaType, fields, bytes, sha256 }) => ({
    name: resource,
    path,
    ...(fields && { profile: 'tabular-data-resource' }),
    mediatype: mediaType,
    encoding: 'utf-8',
    ...(path.endsWith('.gz') && { compression: 'gz' }),
    ...(bytes !== undefined && { bytes }),
    ...(sha256 !== undefined && { hash: `sha256:${sha256}` }),
    ...(fields && { schema: { fields, missingValues: [''] } }),
  })),
});
