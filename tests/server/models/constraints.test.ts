import { Client } from 'pg';
import { Sequelize } from 'sequelize';
import { defineModels } from '@/server/models';
import { installSystems } from '@/server/demo/install-systems';
import { freshDatabase, type TestDatabase } from '../../support/database';
import { laidOutEntry, type LaidOut } from '../../support/laid-out-entry';

let database: TestDatabase;
let sequelize: Sequelize;
let owner: Client;
let ids: LaidOut;
beforeAll(async () => {
  database = await freshDatabase();
  sequelize = new Sequelize(database.url, { dialect: 'postgres', logging: false });
  defineModels(sequelize);
  await installSystems(sequelize);
  // As the role that owns the tables: what holds against it holds against everybody.
  owner = new Client({ connectionString: database.ownerUrl });
  await owner.connect();
  ids = await laidOutEntry(owner);
});
afterAll(async () => {
  await owner.end();
  await sequelize.close();
  await database.drop();
});

const refused = (sql: string, binds: unknown[] = []): Promise<unknown> =>
  owner.query(sql, binds).then(
    () => 'nothing was refused',
    (error: unknown) => (error as { constraint?: string }).constraint ?? String(error),
  );

describe('nobody decides on their own submission', () => {
  it.each<[string, string, string]>([
    [
      'deciding',
      `update submission set review_state = 'declined', decision = 'decline', decided_by = owner_id, decided_at = now(),
         reason = 'out-of-scope', decision_comment = 'no', claimed_by = null, claimed_until = null where id = $1`,
      'submission_four_eyes',
    ],
    [
      'claiming',
      `update submission set review_state = 'in-review', claimed_by = owner_id, claimed_until = now() where id = $1`,
      'submission_four_eyes',
    ],
    [
      'writing it into the history',
      `insert into event (submission_id, kind, actor_id, revision, change)
         select id, 'accepted', owner_id, revision, 9 from submission where id = $1`,
      'event_four_eyes',
    ],
    [
      'letting the machine decide',
      `insert into event (submission_id, kind, revision, change) select id, 'declined', revision, 9 from submission where id = $1`,
      'event_four_eyes',
    ],
    [
      'giving it to somebody else first',
      `update submission set owner_id = gen_random_uuid() where id = $1`,
      'submission_owner_kept',
    ],
    [
      'a contributor deciding',
      `update submission set review_state = 'declined', decision = 'decline', decided_at = now(), reason = 'out-of-scope',
         decision_comment = 'no', decided_by = (select id from account where email = 'other@orbits.example') where id = $1`,
      'submission_decided_by_curator',
    ],
  ])('by %s', async (_, sql, constraint) => {
    expect(await refused(sql, [ids.submitted])).toBe(constraint);
  });
});

describe('a decision', () => {
  it.each<[string, string, string]>([
    [
      'without a reason',
      `update submission set review_state = 'returned', decision = 'return', decided_by = $2, decided_at = now() where id = $1`,
      'submission_reason_given',
    ],
    [
      'without whoever decided',
      `update submission set review_state = 'returned', decision = 'return', reason = 'out-of-scope', decision_comment = 'x' where id = $1 and $2::uuid is not null`,
      'submission_decision_whole',
    ],
    [
      'that accepts without an entry',
      `update submission set review_state = 'accepted', decision = 'accept', decided_by = $2, decided_at = now() where id = $1`,
      'submission_accepted_has_entry',
    ],
    [
      'of an unknown state',
      `update submission set review_state = 'lost' where id = $1 and $2::uuid is not null`,
      'submission_state_known',
    ],
    [
      'of a claim without an end',
      `update submission set review_state = 'in-review', claimed_by = $2 where id = $1`,
      'submission_claim_whole',
    ],
  ])('%s is refused', async (_, sql, constraint) => {
    expect(await refused(sql, [ids.submitted, ids.curator])).toBe(constraint);
  });

  it('that was made stays', async () => {
    const sql = `update submission set review_state = 'draft', decision = null, decided_by = null, decided_at = null, entry_number = null where id = $1`;
    expect(await refused(sql, [ids.accepted])).toBe('submission_end_kept');
  });
});

describe('what cannot be rewritten', () => {
  it.each<[string, string]>([
    [`update event set comment = 'other'`, 'event_immutable'],
    [`delete from event`, 'event_immutable'],
    [`update comment set text = 'other'`, 'comment_immutable'],
    [`delete from comment`, 'comment_immutable'],
    [`update check_report set verdict = 'closes'`, 'check_report_immutable'],
    [`delete from check_report`, 'check_report_kept'],
    [`delete from orbit_check`, 'check_report_kept'],
    [`update orbit_revision set why = 'other'`, 'orbit_revision_immutable'],
    [`delete from orbit_revision`, 'orbit_revision_immutable'],
    [`update reference set citation = 'other'`, 'reference_immutable'],
    [`delete from orbit`, 'orbit_immutable'],
    [`update submission_revision set body = '{}'`, 'submission_revision_immutable'],
    [`delete from submission_revision`, 'submission_revision_immutable'],
    [`update system_version set document = '{}'`, 'system_version_immutable'],
    [`delete from system_version`, 'system_version_immutable'],
  ])('%s', async (sql, constraint) => {
    expect(await refused(sql)).toBe(constraint);
  });
});

describe('numbers', () => {
  it.each<[string, string]>([
    [`update orbit set period = 'NaN'`, 'orbit_period_range'],
    [`update orbit set period = 'Infinity'`, 'orbit_period_range'],
    [`update orbit set period = 0`, 'orbit_period_range'],
    [`update orbit set period_digits = 'NaN'`, 'orbit_period_range'],
    [`update orbit set returns = 5001`, 'orbit_returns_range'],
    [`update orbit set unstable_multiplier = 'NaN'`, 'orbit_multiplier_finite'],
    [`update orbit set stability = 'wobbly'`, 'orbit_stability_known'],
    [`update orbit set accession = 'RTN-00000028'`, 'orbit_accession_form'],
    [`update orbit set curator_id = contributor_id`, 'orbit_four_eyes'],
    [`update orbit set status = 'withdrawn'`, 'orbit_withdrawal_whole'],
    [`update crossing set time = 'NaN'`, 'crossing_time_range'],
    [`update crossing set point = array['NaN'::float8, 1, 27]`, 'crossing_point_finite'],
    [`update orbit_check set compute_ms = 'Infinity'`, 'orbit_check_compute_finite'],
    [`update system set extents = array[1, 'NaN'::float8, 1]`, 'system_extents_positive'],
  ])('%s is refused', async (sql, constraint) => {
    expect(await refused(sql)).toBe(constraint);
  });
});

describe('the last administrator', () => {
  it('is neither lowered nor deleted', async () => {
    expect(await refused(`update account set role = 'curator' where role = 'administrator'`)).toBe(
      'account_last_administrator',
    );
    expect(await refused(`delete from account where role = 'administrator'`)).toBe('account_last_administrator');
  });
});

describe('reports that nothing refers to', () => {
  it('expire after seven days, through the one function that may, and others stay', async () => {
    await owner.query(`alter table check_report disable trigger check_report_immutable`);
    await owner.query(`update check_report set created_at = now() - interval '8 days'`);
    await owner.query(`alter table check_report enable trigger check_report_immutable`);
    await owner.query(`update orbit_check set created_at = now() - interval '8 days'`);
    const kept = async (): Promise<string[]> =>
      (await owner.query<{ check_id: string }>('select check_id from check_report order by 1')).rows.map(
        (r) => r.check_id,
      );
    expect(await kept()).toEqual([ids.privateCheck, ids.submissionCheck].sort());
    expect(await refused('delete from check_report where check_id = $1', [ids.privateCheck])).toBe('check_report_kept');
    const [gone] = (await sequelize.query('select expire_checks() as gone'))[0] as { gone: number }[];
    expect(gone!.gone).toBe(1);
    expect(await kept()).toEqual([ids.submissionCheck]);
    expect(await refused('delete from check_report')).toBe('check_report_kept');
  });
});

describe('accessions', () => {
  it('are never used twice, even when an entry does not come about', async () => {
    const next = async (): Promise<number> =>
      (await owner.query<{ n: number }>(`select nextval('orbit_number')::integer as n`)).rows[0]!.n;
    await owner.query('begin');
    const first = await next();
    await owner.query('rollback');
    expect(await next()).toBeGreaterThan(first);
  });
});
