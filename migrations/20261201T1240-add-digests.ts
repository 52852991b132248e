import { inTransaction, type Migration } from '@/server/migrate';

/** Curators get a mail a day about what is new in the queue, unless they turn it off. */
export const up: Migration = inTransaction(`
  alter table account
    add column digest boolean not null default true,
    add column digest_sent_at timestamptz;
  comment on column account.digest is 'wants the daily mail about new submissions; curators only get it';
`);

export const down: Migration = inTransaction(`
  alter table account
    drop column digest,
    drop column digest_sent_at;
`);
