import { inTransaction, type Migration } from '@/server/migrate';

/**
 * Which entries are each other's images under a symmetry of their system, both ways round.
 *
 * Entries from before know of each other what their reports say: two that were checked at the same time do not.
 */
export const up: Migration = inTransaction(`
  create table orbit_image (
    orbit_number integer not null,
    image_number integer not null,
    symmetry     text    not null,
    constraint orbit_image_once primary key (orbit_number, image_number),
    constraint orbit_image_orbit foreign key (orbit_number) references orbit (number),
    constraint orbit_image_image foreign key (image_number) references orbit (number),
    constraint orbit_image_other check (orbit_number <> image_number)
  );
  insert into orbit_image (orbit_number, image_number, symmetry)
    select pair.*, m.symmetry
    from orbit o
    join orbit_revision r on r.orbit_number = o.number and r.revision = 1
    join check_report p on p.check_id = r.check_id
    cross join lateral json_to_recordset(p.report -> 'matches') as m (accession text, relation text, symmetry text)
    join orbit i on i.accession = m.accession and m.relation = 'symmetric-image'
    cross join lateral (values (o.number, i.number), (i.number, o.number)) as pair (orbit_number, image_number)
    where m.symmetry is not null
    on conflict do nothing;
`);

export const down: Migration = inTransaction(`drop table orbit_image;`);
