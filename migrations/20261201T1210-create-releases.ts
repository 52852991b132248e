import { inTransaction, type Migration } from '@/server/migrate';

/** Dated copies of the whole catalogue. Once cut, a release never changes: its files are kept here byte for byte. */
export const up: Migration = inTransaction(`
  create table release (
    id       integer     primary key generated always as identity,
    state    text        not null default 'cutting',
    note     text        not null default '',
    cut_by   uuid        not null,
    asked_at timestamptz not null default now(),
    cut_at   timestamptz,
    previous integer,
    entries  integer,
    added    integer,
    revised  integer,
    gone     integer,
    failure  text,
    constraint release_cut_by foreign key (cut_by) references account (id),
    constraint release_previous foreign key (previous) references release (id),
    constraint release_state_known check (state in ('cutting', 'ready', 'failed')),
    constraint release_ready_whole check ((state = 'ready')
      = (cut_at is not null and entries is not null and added is not null and revised is not null and gone is not null)),
    constraint release_failed_why check ((state = 'failed') = (failure is not null))
  );
  -- Two at once would each be the other's past.
  create unique index release_one_in_work on release ((true)) where state = 'cutting';
  comment on column release.gone is 'entries of the release before that were withdrawn since';

  create table release_entry (
    release_id   integer not null,
    orbit_number integer not null,
    revision     integer not null,
    constraint release_entry_once primary key (release_id, orbit_number),
    constraint release_entry_release foreign key (release_id) references release (id),
    constraint release_entry_revision foreign key (orbit_number, revision)
      references orbit_revision (orbit_number, revision)
  );

  create table release_file (
    release_id integer not null,
    name       text    not null,
    media_type text    not null,
    bytes      bigint  not null,
    sha256     text    not null,
    constraint release_file_once primary key (release_id, name),
    constraint release_file_release foreign key (release_id) references release (id),
    constraint release_file_hash check (sha256 ~ '^[0-9a-f]{64}$')
  );
  create table release_part (
    release_id integer not null,
    name       text    not null,
    position   integer not null,
    content    bytea   not null,
    constraint release_part_once primary key (release_id, name, position),
    constraint release_part_release foreign key (release_id) references release (id)
  );
  comment on table release_part is 'the bytes of a file, a megabyte a row';

  create function refuse_change_of_release() returns trigger language plpgsql as $$
  begin
    if tg_op = 'UPDATE' and old.state = 'cutting' then return new; end if;
    raise exception 'a release that was cut never changes'
      using errcode = 'integrity_constraint_violation', constraint = 'release_immutable';
  end $$;
  create trigger release_immutable before update or delete on release
    for each row execute function refuse_change_of_release();
  create trigger release_entry_immutable before update or delete on release_entry
    for each row execute function refuse_rewriting();
  create trigger release_file_immutable before update or delete on release_file
    for each row execute function refuse_rewriting();
  create trigger release_part_immutable before update or delete on release_part
    for each row execute function refuse_rewriting();
`);

export const down: Migration = inTransaction(`
  drop table release_part, release_file, release_entry, release;
  drop function refuse_change_of_release();
`);
