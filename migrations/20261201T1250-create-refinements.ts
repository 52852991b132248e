import { inTransaction, type Migration } from '@/server/migrate';

/**
 * Entries computed to many digits: each revision says how its figures are known, and what was tried is kept with how it
 * ended, so that what cannot be refined says why and is not tried for ever.
 */
export const up: Migration = inTransaction(`
  alter table orbit_revision add column evidence text, add column digits integer;
  -- Written once, for revisions that were made before they said this themselves.
  alter table orbit_revision disable trigger orbit_revision_immutable;
  update orbit_revision r set evidence = o.evidence, digits = o.digits from orbit o where o.number = r.orbit_number;
  alter table orbit_revision enable trigger orbit_revision_immutable;
  alter table orbit_revision
    alter column evidence set not null,
    alter column digits set not null,
    add constraint orbit_revision_evidence_known check (evidence in ('re-integrated', 'refined', 'proved')),
    add constraint orbit_revision_digits_range check (digits >= 0);

  alter table orbit add column obstacle json;
  comment on column orbit.obstacle is 'why the last refinement gave no more digits: digits asked for, reason, message';

  create table refinement (
    id             uuid        primary key default gen_random_uuid(),
    orbit_number   integer     not null,
    digits         integer     not null,
    asked_by       uuid,
    state          text        not null default 'queued',
    seconds        integer     not null,
    attempts       integer     not null default 0,
    revision       integer,
    reason         text,
    message        text,
    failure        text,
    engine_version text,
    compute_ms     double precision not null default 0,
    created_at     timestamptz not null default now(),
    started_at     timestamptz,
    finished_at    timestamptz,
    constraint refinement_orbit foreign key (orbit_number) references orbit (number),
    constraint refinement_revision foreign key (orbit_number, revision)
      references orbit_revision (orbit_number, revision),
    constraint refinement_asked_by foreign key (asked_by) references account (id),
    constraint refinement_digits_range check (digits between 18 and 100),
    constraint refinement_state_known check (state in ('queued', 'running', 'done', 'failed')),
    constraint refinement_done_told check ((state = 'done') = (engine_version is not null)
      and (state = 'done') = (revision is not null or reason is not null)
      and (revision is null or reason is null) and (reason is null) = (message is null)),
    constraint refinement_failure_told check ((state = 'failed') = (failure is not null)),
    constraint refinement_finished check ((state in ('done', 'failed')) = (finished_at is not null)),
    constraint refinement_seconds_positive check (seconds > 0),
    constraint refinement_attempts check (attempts >= 0),
    constraint refinement_compute_finite check (compute_ms >= 0 and compute_ms < 'infinity')
  );
  comment on column refinement.asked_by is 'null: the archive itself, as for every entry';
  comment on column refinement.revision is 'the revision of the entry that has these digits';
  comment on column refinement.seconds is 'computing time it may take';
  -- Whoever asks for digits that are being computed already waits for those.
  create unique index refinement_once_under_way on refinement (orbit_number, digits) where state in ('queued', 'running');
  create index refinement_by_orbit on refinement (orbit_number, created_at);
  create index refinement_by_person on refinement (asked_by, finished_at) where asked_by is not null;
  create index refinement_unfinished on refinement (created_at) where state in ('queued', 'running');
`);

export const down: Migration = inTransaction(`
  drop table refinement;
  alter table orbit drop column obstacle;
  alter table orbit_revision drop column evidence, drop column digits;
`);
