import { inTransaction, type Migration } from '@/server/migrate';

/** Submissions, one row each, and their revisions: what was typed, unchanged once it was sent. */
export const up: Migration = inTransaction(`
  create table submission (
    id               uuid        primary key default gen_random_uuid(),
    number           integer     not null generated always as identity,
    owner_id         uuid        not null,
    review_state     text        not null default 'draft',
    revision         integer     not null default 1,
    claimed_by       uuid,
    claimed_until    timestamptz,
    decision         text,
    decided_by       uuid,
    decided_at       timestamptz,
    reason           text,
    decision_comment text,
    entry_number     integer,
    changes          integer     not null default 0,
    created_at       timestamptz not null default now(),
    sent_at          timestamptz,
    updated_at       timestamptz not null default now(),
    constraint submission_number_once unique (number),
    constraint submission_owner foreign key (owner_id) references account (id),
    constraint submission_claimed_by foreign key (claimed_by) references account (id),
    constraint submission_decided_by foreign key (decided_by) references account (id),
    constraint submission_state_known check (review_state in
      ('draft', 'submitted', 'in-review', 'accepted', 'returned', 'declined', 'withdrawn')),
    constraint submission_four_eyes check (decided_by <> owner_id and claimed_by <> owner_id),
    constraint submission_claim_whole check ((claimed_by is null) = (claimed_until is null)
      and (claimed_by is not null) = (review_state = 'in-review')),
    constraint submission_decision_whole check (
      case when review_state in ('accepted', 'returned', 'declined')
        then decided_by is not null and decided_at is not null
          and decision = case review_state when 'accepted' then 'accept' when 'returned' then 'return' else 'decline' end
        else decision is null and decided_by is null and decided_at is null end),
    constraint submission_reason_given check (coalesce(decision, 'accept') = 'accept'
      or (reason is not null and decision_comment <> '')),
    constraint submission_reason_known check (reason in ('does-not-close', 'not-transverse', 'already-known', 'not-prime',
      'wrong-system-or-parameters', 'out-of-scope', 'description-lacking')),
    constraint submission_accepted_has_entry check ((review_state = 'accepted') = (entry_number is not null)),
    constraint submission_sent check (review_state in ('draft', 'withdrawn') or sent_at is not null),
    constraint submission_revision_positive check (revision > 0)
  );
  comment on column submission.number is 'shown to people; the id is in addresses';
  comment on column submission.changes is 'counts what the ETag has to tell apart';
  create index submission_by_owner on submission (owner_id, updated_at desc, id);
  create index submission_to_review on submission (sent_at, id) where review_state in ('submitted', 'in-review');

  create table submission_revision (
    submission_id  uuid        not null,
    revision       integer     not null,
    body           json        not null,
    system_id      uuid,
    system_version integer,
    created_at     timestamptz not null default now(),
    sent_at        timestamptz,
    constraint submission_revision_once primary key (submission_id, revision),
    constraint submission_revision_submission foreign key (submission_id) references submission (id),
    constraint submission_revision_system foreign key (system_id, system_version)
      references system_version (system_id, version),
    constraint submission_revision_sent check (sent_at is null or system_id is not null),
    constraint submission_revision_positive check (revision > 0)
  );
  comment on column submission_revision.body is 'as typed, to the character: json, because jsonb would set numbers anew';
  alter table submission add constraint submission_current_revision foreign key (id, revision)
    references submission_revision (submission_id, revision) deferrable initially deferred;
`);

export const down: Migration = inTransaction(`
  alter table submission drop constraint submission_current_revision;
  drop table submission_revision;
  drop table submission;
`);
