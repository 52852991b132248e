import { inTransaction, type Migration } from '@/server/migrate';

/** Checks that were asked for, and their reports. A check's id is random: whoever holds it may read a private check. */
export const up: Migration = inTransaction(`
  create table orbit_check (
    id             text        primary key,
    body           json        not null,
    system_id      uuid,
    system_version integer,
    owner_id       uuid,
    address_hash   text,
    submission_id  uuid,
    revision       integer,
    state          text        not null default 'queued',
    seconds        integer     not null,
    progress       json,
    attempts       integer     not null default 0,
    failure        text,
    engine_version text,
    compute_ms     double precision not null default 0,
    created_at     timestamptz not null default now(),
    started_at     timestamptz,
    finished_at    timestamptz,
    constraint orbit_check_id_form check (id ~ '^[A-Za-z0-9_-]{22}$'),
    constraint orbit_check_system foreign key (system_id, system_version)
      references system_version (system_id, version),
    constraint orbit_check_owner foreign key (owner_id) references account (id),
    constraint orbit_check_revision foreign key (submission_id, revision)
      references submission_revision (submission_id, revision),
    constraint orbit_check_system_whole check ((system_id is null) = (system_version is null)),
    constraint orbit_check_revision_whole check ((submission_id is null) = (revision is null)),
    constraint orbit_check_somebodys check (owner_id is not null or address_hash is not null),
    constraint orbit_check_state_known check (state in ('queued', 'running', 'done', 'failed')),
    constraint orbit_check_failure_told check ((state = 'failed') = (failure is not null)),
    constraint orbit_check_finished check ((state in ('done', 'failed')) = (finished_at is not null)),
    constraint orbit_check_seconds_positive check (seconds > 0),
    constraint orbit_check_attempts check (attempts >= 0),
    constraint orbit_check_compute_finite check (compute_ms >= 0 and compute_ms < 'infinity')
  );
  comment on column orbit_check.id is '128 random bits, base64url';
  comment on column orbit_check.system_id is 'null: the body holds a whole system document';
  comment on column orbit_check.address_hash is 'keyed hash of the address of somebody without account, for the limits';
  comment on column orbit_check.seconds is 'computing time it may take';
  create index orbit_check_by_owner on orbit_check (owner_id, finished_at) where owner_id is not null;
  create index orbit_check_by_address on orbit_check (address_hash, finished_at) where address_hash is not null;
  create index orbit_check_by_revision on orbit_check (submission_id, revision, created_at)
    where submission_id is not null;
  create index orbit_check_private_by_age on orbit_check (created_at) where submission_id is null;
  create index orbit_check_unfinished on orbit_check (created_at) where state in ('queued', 'running');

  create table check_report (
    check_id       text        primary key,
    report         json        not null,
    verdict        text        not null,
    blocked        boolean     not null,
    engine_version text        not null,
    created_at     timestamptz not null default now(),
    constraint check_report_check foreign key (check_id) references orbit_check (id) on delete cascade,
    constraint check_report_verdict_known check (verdict in
      ('closes', 'closes-after-correction', 'does-not-close', 'inconclusive'))
  );
  comment on column check_report.blocked is 'holds a finding that is a blocker';
`);

export const down: Migration = inTransaction('drop table check_report; drop table orbit_check;');
