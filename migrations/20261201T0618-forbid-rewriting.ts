import { inTransaction, type Migration } from '@/server/migrate';

/** What was said, sent, reported or published cannot be rewritten, by nobody. */
export const up: Migration = inTransaction(`
  create function refuse_rewriting() returns trigger language plpgsql as $$
  begin
    raise exception '% rows never change', tg_table_name
      using errcode = 'integrity_constraint_violation', constraint = tg_table_name || '_immutable';
  end $$;
  create trigger event_immutable before update or delete on event
    for each row execute function refuse_rewriting();
  create trigger comment_immutable before update or delete on comment
    for each row execute function refuse_rewriting();
  create trigger orbit_revision_immutable before update or delete on orbit_revision
    for each row execute function refuse_rewriting();
  create trigger reference_immutable before update or delete on reference
    for each row execute function refuse_rewriting();
  create trigger orbit_never_deleted before delete on orbit
    for each row execute function refuse_rewriting();
  create trigger check_report_immutable before update on check_report
    for each row execute function refuse_rewriting();

  create function refuse_change_of_sent_revision() returns trigger language plpgsql as $$
  begin
    if tg_op = 'UPDATE' and old.sent_at is null then return new; end if;
    raise exception 'a revision that was sent never changes'
      using errcode = 'integrity_constraint_violation', constraint = 'submission_revision_immutable';
  end $$;
  create trigger submission_revision_immutable before update or delete on submission_revision
    for each row execute function refuse_change_of_sent_revision();

  -- A report may go only after seven days, only when nothing refers to it, and only through expire_checks().
  create function refuse_report_deletion() returns trigger language plpgsql as $$
  begin
    if current_setting('ritornel.expiring', true) = 'on' and old.created_at < now() - interval '7 days' and not exists
      (select 1 from orbit_check where id = old.check_id and submission_id is not null) then
      return old;
    end if;
    raise exception 'reports are kept'
      using errcode = 'integrity_constraint_violation', constraint = 'check_report_kept';
  end $$;
  create trigger check_report_kept before delete on check_report
    for each row execute function refuse_report_deletion();

  create function expire_checks() returns integer language plpgsql security definer set search_path = public as $$
  declare gone integer;
  begin
    perform set_config('ritornel.expiring', 'on', true);
    delete from check_report r using orbit_check c where c.id = r.check_id and c.submission_id is null
      and c.created_at < now() - interval '7 days' and r.created_at < now() - interval '7 days';
    delete from orbit_check c where c.submission_id is null and c.created_at < now() - interval '7 days'
      and c.finished_at is not null and not exists (select 1 from check_report r where r.check_id = c.id);
    get diagnostics gone = row_count;
    perform set_config('ritornel.expiring', 'off', true);
    return gone;
  end $$;
`);

export const down: Migration = inTransaction(`
  drop function expire_checks();
  drop trigger check_report_kept on check_report; drop function refuse_report_deletion();
  drop trigger submission_revision_immutable on submission_revision; drop function refuse_change_of_sent_revision();
  drop trigger check_report_immutable on check_report; drop trigger orbit_never_deleted on orbit;
  drop trigger reference_immutable on reference; drop trigger orbit_revision_immutable on orbit_revision;
  drop trigger comment_immutable on comment; drop trigger event_immutable on event;
  drop function refuse_rewriting();
`);
