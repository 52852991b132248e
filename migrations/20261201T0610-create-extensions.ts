import { inTransaction, type Migration } from '@/server/migrate';

/** Nearest neighbours among crossings (cube, led by the system through btree_gist) and words within texts (pg_trgm). */
export const up: Migration = inTransaction(`
  create extension if not exists cube;
  create extension if not exists btree_gist;
  create extension if not exists pg_trgm;
`);

export const down: Migration = inTransaction(`
  drop extension pg_trgm;
  drop extension btree_gist;
  drop extension cube;
`);
