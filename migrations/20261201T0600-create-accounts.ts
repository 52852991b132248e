import { inTransaction, type Migration } from '@/server/migrate';

/** Accounts and what signs them in. */
export const up: Migration = inTransaction(`
  create table account (
    id            uuid        primary key default gen_random_uuid(),
    name          text        not null,
    email         text        not null,
    orcid         text,
    role          text        not null default 'reader',
    password_hash text        not null,
    confirmed_at  timestamptz,
    created_at    timestamptz not null default now(),
    constraint account_role_known check (role in ('reader', 'contributor', 'curator', 'administrator')),
    constraint account_email_lower check (email = lower(email)),
    constraint account_email_once unique (email)
  );
  create index account_by_name on account (lower(name), id);

  create table one_time_token (
    token_hash text        primary key,
    account_id uuid        not null,
    purpose    text        not null,
    expires_at timestamptz not null,
    constraint one_time_token_purpose_known check (purpose in ('confirm', 'reset')),
    constraint one_time_token_account foreign key (account_id) references account (id) on delete cascade
  );
  create index one_time_token_by_account on one_time_token (account_id, purpose);

  -- The columns that connect-pg-simple expects.
  create table session (
    sid    text         primary key,
    sess   json         not null,
    expire timestamp(6) not null
  );
  create index session_by_expiry on session (expire);
  create index session_by_account on session ((sess -> 'passport' ->> 'user'));
`);

export const down: Migration = inTransaction('drop table session; drop table one_time_token; drop table account;');
