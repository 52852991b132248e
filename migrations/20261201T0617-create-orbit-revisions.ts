import { inTransaction, type Migration } from '@/server/migrate';

/** What belongs to one revision of an entry: its figures, its sources, and the crossings that searches measure from. */
export const up: Migration = inTransaction(`
  create table orbit_revision (
    orbit_number integer     not null,
    revision     integer     not null,
    content      json        not null,
    check_id     text        not null,
    made_by      uuid,
    why          text        not null,
    at           timestamptz not null default now(),
    constraint orbit_revision_once primary key (orbit_number, revision),
    constraint orbit_revision_orbit foreign key (orbit_number) references orbit (number),
    constraint orbit_revision_check foreign key (check_id) references orbit_check (id),
    constraint orbit_revision_made_by foreign key (made_by) references account (id),
    constraint orbit_revision_positive check (revision > 0)
  );
  comment on column orbit_revision.content is 'the figures as decimal strings and the body as typed';
  alter table orbit add constraint orbit_current_revision foreign key (number, revision)
    references orbit_revision (orbit_number, revision) deferrable initially deferred;

  create table reference (
    orbit_number integer not null,
    revision     integer not null,
    position     integer not null,
    citation     text    not null,
    doi          text,
    constraint reference_once primary key (orbit_number, revision, position),
    constraint reference_revision foreign key (orbit_number, revision)
      references orbit_revision (orbit_number, revision),
    constraint reference_said check (citation <> '')
  );

  create table crossing (
    system_id     uuid             not null,
    orbit_number  integer          not null,
    position      integer          not null,
    time          double precision not null,
    point         double precision[] not null,
    transversality double precision not null,
    place         cube             not null,
    constraint crossing_once primary key (system_id, orbit_number, position),
    constraint crossing_system foreign key (system_id) references system (id),
    constraint crossing_orbit foreign key (orbit_number) references orbit (number),
    constraint crossing_time_range check (time > 0 and time < 'infinity'),
    constraint crossing_point_finite check ('-infinity' < all (point) and 'infinity' > all (point)),
    constraint crossing_place_matches check (cube_dim(place) <= cardinality(point))
  );
  comment on table crossing is 'crossings of current revisions, in the order of time; the last is the start, at T';
  comment on column crossing.place is 'the point in units of system.extents, angles reduced to one turn';
  create index crossing_by_place on crossing using gist (system_id, place);
`);

export const down: Migration = inTransaction(`
  alter table orbit drop constraint orbit_current_revision;
  drop table crossing;
  drop table reference;
  drop table orbit_revision;
`);
