import { inTransaction, type Migration } from '@/server/migrate';

/** What the server keeps about requests: outgoing mail, idempotency keys, rate limits. */
export const up: Migration = inTransaction(`
  create table outgoing_mail (
    id         uuid        primary key default gen_random_uuid(),
    recipient  text        not null,
    subject    text        not null,
    body       text        not null,
    created_at timestamptz not null default now(),
    sent_at    timestamptz
  );
  create index outgoing_mail_waiting on outgoing_mail (created_at) where sent_at is null;

  create table idempotency_key (
    owner        text        not null,
    key          text        not null,
    request_hash text        not null,
    status       integer,
    headers      jsonb,
    body         text,
    created_at   timestamptz not null default now(),
    constraint idempotency_key_once primary key (owner, key)
  );
  create index idempotency_key_by_age on idempotency_key (created_at);

  -- The columns that rate-limiter-flexible expects.
  create table rate_limit (
    key    varchar(255) primary key,
    points integer      not null default 0,
    expire bigint
  );
`);

export const down: Migration = inTransaction(
  'drop table rate_limit; drop table idempotency_key; drop table outgoing_mail;',
);
