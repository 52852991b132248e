import { inTransaction, type Migration } from '@/server/migrate';

/** Workers that are alive tell so every few seconds; the jobs of one that fell silent are given to the others. */
export const up: Migration = inTransaction(`
  create table worker (
    id             uuid        primary key,
    queue_ids      text[]      not null default '{}',
    host           text        not null,
    process_id     integer     not null,
    engine_version text        not null,
    started_at     timestamptz not null default now(),
    beat_at        timestamptz not null default now()
  );
  comment on column worker.queue_ids is 'names under which the process locks jobs';
  create index worker_by_beat on worker (beat_at);
`);

export const down: Migration = inTransaction('drop table worker;');
