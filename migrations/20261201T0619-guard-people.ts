import { inTransaction, type Migration } from '@/server/migrate';

/** Four eyes on every decision, and always an administrator. */
export const up: Migration = inTransaction(`
  create function guard_submission() returns trigger language plpgsql as $$
  begin
    if new.owner_id <> old.owner_id or new.number <> old.number then
      raise exception 'a submission keeps its owner and its number'
        using errcode = 'integrity_constraint_violation', constraint = 'submission_owner_kept';
    end if;
    if old.review_state in ('accepted', 'declined', 'withdrawn') and new.review_state <> old.review_state then
      raise exception 'a submission that is % stays so', old.review_state
        using errcode = 'integrity_constraint_violation', constraint = 'submission_end_kept';
    end if;
    if new.decided_by is not null and new.decided_by is distinct from old.decided_by and not exists
      (select 1 from account where id = new.decided_by and role in ('curator', 'administrator')) then
      raise exception 'only curators decide'
        using errcode = 'integrity_constraint_violation', constraint = 'submission_decided_by_curator';
    end if;
    return new;
  end $$;
  create trigger submission_guard before update on submission
    for each row execute function guard_submission();

  create function guard_event() returns trigger language plpgsql as $$
  begin
    if new.kind in ('accepted', 'returned', 'declined', 'claimed', 'taken-over') and (new.actor_id is null or exists
      (select 1 from submission where id = new.submission_id and owner_id = new.actor_id)) then
      raise exception 'nobody decides on their own submission'
        using errcode = 'integrity_constraint_violation', constraint = 'event_four_eyes';
    end if;
    return new;
  end $$;
  create trigger event_four_eyes before insert on event
    for each row execute function guard_event();

  create function guard_last_administrator() returns trigger language plpgsql as $$
  begin
    if old.role <> 'administrator' or (tg_op = 'UPDATE' and new.role = 'administrator') then
      return case tg_op when 'DELETE' then old else new end;
    end if;
    -- Two administrators who lower each other at once: the second waits and then finds itself the last.
    perform pg_advisory_xact_lock(hashtextextended('last administrator', 0));
    if not exists (select 1 from account where role = 'administrator' and id <> old.id) then
      raise exception 'the last administrator keeps the role'
        using errcode = 'integrity_constraint_violation', constraint = 'account_last_administrator';
    end if;
    return case tg_op when 'DELETE' then old else new end;
  end $$;
  create trigger account_last_administrator before update or delete on account
    for each row execute function guard_last_administrator();
`);

export const down: Migration = inTransaction(`
  drop trigger account_last_administrator on account;
  drop function guard_last_administrator();
  drop trigger event_four_eyes on event;
  drop function guard_event();
  drop trigger submission_guard on submission;
  drop function guard_submission();
`);
