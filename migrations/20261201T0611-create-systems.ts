import { inTransaction, type Migration } from '@/server/migrate';

/** Systems in versions, and the sections that entries lie on. A version's document never changes. */
export const up: Migration = inTransaction(`
  create table system (
    id              uuid             primary key default gen_random_uuid(),
    slug            text             not null,
    current_version integer          not null default 1,
    extents         double precision[],
    position        integer          not null default 0,
    created_at      timestamptz      not null default now(),
    constraint system_slug_once unique (slug),
    constraint system_slug_form check (slug ~ '^[a-z][a-z0-9-]{0,39}$'),
    constraint system_extents_positive check (0 < all (extents) and 'infinity' > all (extents))
  );
  comment on column system.extents is 'unit of each coordinate in crossing.place: the sizes of the first entry, then fixed';
  comment on column system.position is 'place in the list of systems; equal places are ordered by name';

  create table system_version (
    system_id   uuid        not null,
    version     integer     not null,
    document    json        not null,
    state       text        not null default 'accepted',
    accepted_at timestamptz not null default now(),
    accepted_by uuid,
    constraint system_version_once primary key (system_id, version),
    constraint system_version_system foreign key (system_id) references system (id),
    constraint system_version_accepted_by foreign key (accepted_by) references account (id),
    constraint system_version_positive check (version > 0),
    constraint system_version_state_known check (state in ('proposed', 'accepted', 'declined'))
  );
  comment on column system_version.document is 'as it was proposed, to the character';
  comment on column system_version.accepted_by is 'null: comes with the archive';
  alter table system add constraint system_current_version
    foreign key (id, current_version) references system_version (system_id, version) deferrable initially deferred;

  create table section (
    id        uuid primary key default gen_random_uuid(),
    system_id uuid not null,
    name      text,
    formula   text not null,
    constraint section_system foreign key (system_id) references system (id),
    constraint section_once unique nulls not distinct (system_id, name, formula),
    constraint section_of_system unique (system_id, id)
  );
  comment on column section.name is 'null: an inline section that no named one equals';

  create function refuse_document_change() returns trigger language plpgsql as $$
  begin
    if tg_op = 'UPDATE' and new.system_id = old.system_id and new.version = old.version
       and new.document::text = old.document::text then
      return new;
    end if;
    raise exception 'a version of a system never changes'
      using errcode = 'integrity_constraint_violation', constraint = 'system_version_immutable';
  end $$;
  create trigger system_version_immutable before update or delete on system_version
    for each row execute function refuse_document_change();
`);

export const down: Migration = inTransaction(`
  alter table system drop constraint system_current_version;
  drop table section;
  drop table system_version;
  drop table system;
  drop function refuse_document_change();
`);
