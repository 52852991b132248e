import { inTransaction, type Migration } from '@/server/migrate';

/** Entries of the catalogue: one row each with the columns that searches use, and revisions that never change. */
export const up: Migration = inTransaction(`
  create sequence orbit_number as integer maxvalue 9999999 no cycle;
  create table orbit (
    number              integer          primary key default nextval('orbit_number'),
    accession           text             not null,
    system_id           uuid             not null,
    system_version      integer          not null,
    section_id          uuid             not null,
    revision            integer          not null default 1,
    status              text             not null default 'accepted',
    parameters          json             not null,
    parameter_values    jsonb            not null,
    parameters_hash     text             not null,
    period              double precision not null,
    period_digits       numeric          not null,
    returns             integer          not null,
    stability           text             not null,
    unstable_directions integer          not null,
    unstable_multiplier double precision not null,
    itinerary           text,
    evidence            text             not null default 're-integrated',
    digits              integer          not null,
    search_text         text             not null,
    incipit             json             not null,
    submission_id       uuid             not null,
    contributor_id      uuid             not null,
    curator_id          uuid             not null,
    submitted_at        timestamptz      not null,
    accepted_at         timestamptz      not null default clock_timestamp(),
    withdrawn_at        timestamptz,
    withdrawal_reason   text,
    replacement         integer,
    constraint orbit_accession_once unique (accession),
    constraint orbit_accession_form check (accession ~ '^RTN-[0-9]{7}[0-9X]$'
      and substr(accession, 5, 7) = lpad(number::text, 7, '0')),
    constraint orbit_submission_once unique (submission_id),
    constraint orbit_system foreign key (system_id, system_version) references system_version (system_id, version),
    constraint orbit_section foreign key (system_id, section_id) references section (system_id, id),
    constraint orbit_submission foreign key (submission_id) references submission (id),
    constraint orbit_contributor foreign key (contributor_id) references account (id),
    constraint orbit_curator foreign key (curator_id) references account (id),
    constraint orbit_replacement foreign key (replacement) references orbit (number),
    constraint orbit_four_eyes check (curator_id <> contributor_id),
    constraint orbit_status_known check (status in ('accepted', 'withdrawn')),
    constraint orbit_withdrawal_whole check ((status = 'withdrawn') = (withdrawn_at is not null)
      and (withdrawn_at is null) = (withdrawal_reason is null)),
    constraint orbit_period_range check (period > 0 and period < 'infinity' and period_digits > 0
      and period_digits < 1e100),
    constraint orbit_returns_range check (returns between 1 and 5000),
    constraint orbit_stability_known check (stability in ('stable', 'saddle', 'unstable', 'neutral', 'undecided')),
    constraint orbit_multiplier_finite check (unstable_multiplier >= 0 and unstable_multiplier < 'infinity'),
    constraint orbit_evidence_known check (evidence in ('re-integrated', 'refined', 'proved')),
    constraint orbit_digits_range check (digits >= 0)
  );
  alter sequence orbit_number owned by orbit.number;
  comment on column orbit.parameters is 'all of them, name to text as typed or as the system has it, in its order';
  comment on column orbit.parameter_values is 'the same as doubles, for searches';
  comment on column orbit.parameters_hash is 'of the doubles: equal for orbits of the very same flow';
  comment on column orbit.period_digits is 'every digit; period is its nearest double';
  comment on column orbit.unstable_multiplier is 'modulus of the largest multiplier, 0 where there is none';
  comment on column orbit.incipit is '[time, value] pairs of the coordinate that the section''s staff shows';
  alter table submission add constraint submission_entry foreign key (entry_number) references orbit (number);
`);

export const down: Migration = inTransaction(`
  alter table submission drop constraint submission_entry;
  drop table orbit;
`);
