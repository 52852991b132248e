import type { Check, CheckReport, Decision, DraftBody, ReasonCode, ReviewState } from '@/schemas/generated/contract';
import { ENGINE_VERSION } from '@/server/checks/engine-version';
import type { OrbitCheckState } from '@/server/models/orbit-check';

/** A submission as the database answers it, joined with its revision, its check, its report and the people. */
export interface SubmissionRow {
  id: string;
  number: number;
  revision: number;
  review_state: ReviewState;
  changes: number;
  owner_id: string;
  owner_name: string;
  claimed_by: string | null;
  claimed_until: Date | null;
  claimer_name: string | null;
  decision: Decision['decision'] | null;
  decider_name: string | null;
  decided_at: Date | null;
  reason: ReasonCode | null;
  decision_comment: string | null;
  accession: string | null;
  created_at: Date;
  sent_at: Date | null;
  updated_at: Date;
  body: DraftBody;
  check_id: string | null;
  check_state: OrbitCheckState | null;
  check_current: boolean | null;
  progress: Check['progress'];
  attempts: number | null;
  failure: string | null;
  report: CheckReport | null;
  report_current: boolean | null;
  blocked: boolean;
  /** Null where nothing is to be done. */
  turn: 'curator' | 'contributor' | 'machine' | null;
}

/** `$1` of every statement with `submissionTables`: the version of the engine that reports have to be of. */
export const engineBind = ENGINE_VERSION;

/** The tables behind `submissionColumns`; latest check and latest report of the current revision. */
export const submissionTables = `
  submission s
  join account o on o.id = s.owner_id
  join submission_revision r on r.submission_id = s.id and r.revision = s.revision
  left join account cl on cl.id = s.claimed_by and s.claimed_until > now()
  left join account de on de.id = s.decided_by
  left join orbit e on e.number = s.entry_number
  left join lateral (
    select c.id, c.state, c.progress, c.attempts, c.failure,
      c.engine_version is not distinct from $1 and c.system_version = y.current_version as is_current
    from orbit_check c left join system y on y.id = c.system_id
    where c.submission_id = s.id and c.revision = s.revision order by c.created_at desc limit 1) c on true
  left join lateral (
    select p.report, p.blocked, p.engine_version = $1 and c2.system_version = y.current_version as is_current
    from orbit_check c2 join check_report p on p.check_id = c2.id left join system y on y.id = c2.system_id
    where c2.submission_id = s.id and c2.revision = s.revision order by c2.created_at desc limit 1) p on true`;

/** Whether a blocker keeps a submission that was sent from the review queue. */
export const isBlocked = `(s.review_state in ('submitted', 'in-review') and coalesce(p.blocked, false)
  and coalesce(c.state, 'done') = 'done')`;

/** Whose turn it is. */
export const turnOf = `case
  when s.review_state in ('draft', 'returned') then 'contributor'
  when s.review_state not in ('submitted', 'in-review') then null
  when c.state in ('queued', 'running') then 'machine'
  when s.review_state = 'submitted' and ${isBlocked} then 'contributor'
  else 'curator' end`;

/** Columns of a `SubmissionRow`. */
export const submissionColumns = `
  s.id, s.number, s.revision, s.review_state, s.changes, s.owner_id, o.name as owner_name,
  case when cl.id is not null then s.claimed_by end as claimed_by, s.claimed_until, cl.name as claimer_name, s.decision,
  de.name as decider_name, s.decided_at, s.reason, s.decision_comment, e.accession, s.created_at, s.sent_at,
  s.updated_at, r.body, c.id as check_id, c.state as check_state, c.is_current as check_current, c.progress, c.attempts,
  c.failure, p.report, p.is_current as report_current, ${isBlocked} as blocked, ${turnOf} as turn`;
