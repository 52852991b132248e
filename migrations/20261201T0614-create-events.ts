import { inTransaction, type Migration } from '@/server/migrate';

/** The history of submissions and what was said about them; neither can be rewritten. */
export const up: Migration = inTransaction(`
  create table event (
    id            integer     primary key generated always as identity,
    submission_id uuid        not null,
    kind          text        not null,
    actor_id      uuid,
    from_state    text,
    to_state      text,
    revision      integer     not null,
    check_id      text,
    reason        text,
    comment       text,
    change        integer     not null,
    at            timestamptz not null default now(),
    constraint event_submission foreign key (submission_id, revision)
      references submission_revision (submission_id, revision),
    constraint event_actor foreign key (actor_id) references account (id),
    constraint event_check foreign key (check_id) references orbit_check (id),
    constraint event_kind_known check (kind in ('created', 'edited', 'sent', 'checked', 'check-failed', 'recheck-asked',
      'pulled-back', 'claimed', 'taken-over', 'released', 'claim-expired', 'commented', 'accepted', 'returned',
      'declined', 'withdrawn'))
  );
  comment on column event.actor_id is 'null: the machine';
  comment on column event.change is 'submission.changes once it had happened';
  create index event_by_submission on event (submission_id, id);

  create table comment (
    id            uuid        primary key default gen_random_uuid(),
    submission_id uuid        not null,
    author_id     uuid        not null,
    revision      integer     not null,
    text          text        not null,
    at            timestamptz not null default now(),
    constraint comment_submission foreign key (submission_id, revision)
      references submission_revision (submission_id, revision),
    constraint comment_author foreign key (author_id) references account (id),
    constraint comment_said check (text <> '')
  );
  create index comment_by_submission on comment (submission_id, at);
`);

export const down: Migration = inTransaction('drop table comment; drop table event;');
