import type { Client } from 'pg';

/** What stands in a database in which one orbit was accepted and one submission waits. */
export interface LaidOut {
  curator: string;
  submitted: string;
  accepted: string;
  privateCheck: string;
  submissionCheck: string;
}

const PRIVATE_CHECK = 'AAAAAAAAAAAAAAAAAAAAAA';
const SUBMISSION_CHECK = 'BBBBBBBBBBBBBBBBBBBBBB';

/** Write, with plain SQL, an accepted and a waiting submission, an entry and a private check into an empty database. */
export async function laidOutEntry(db: Client): Promise<LaidOut> {
  const account = async (email: string, role: string): Promise<string> =>
    idOf(db, `insert into account (name, email, role, password_hash) values ($1, $1, $2, 'x') returning id`, [
      email,
      role,
    ]);
  const curator = await account('curator@orbits.example', 'curator');
  const contributor = await account('contributor@orbits.example', 'curator');
  await account('other@orbits.example', 'contributor');
  await account('administrator@orbits.example', 'administrator');
  const system = await idOf(db, `select id from system where slug = 'lorenz'`);
  const submission = async (): Promise<string> => {
    await db.query('begin');
    const id = await idOf(
      db,
      `insert into submission (owner_id, review_state, sent_at) values ($1, 'submitted', now()) returning id`,
      [contributor],
    );
    await db.query(
      `insert into submission_revision (submission_id, revision, body, system_id, system_version, sent_at)
       values ($1, 1, '{"system": "lorenz"}', $2, 1, now())`,
      [id, system],
    );
    await db.query('commit');
    return id;
  };
  const [accepted, submitted] = [await submission(), await submission()];
  for (const [id, of] of [
    [PRIVATE_CHECK, null],
    [SUBMISSION_CHECK, accepted],
  ]) {
    await db.query(
      `insert into orbit_check (id, body, system_id, system_version, owner_id, submission_id, revision, state, seconds,
         finished_at) values ($1, '{}', $2, 1, $3, $4, $5, 'done', 20, now())`,
      [id, system, contributor, of, of === null ? null : 1],
    );
    await db.query(
      `insert into check_report (check_id, report, verdict, blocked, engine_version) values ($1, '{}', 'does-not-close', true, '1')`,
      [id],
    );
  }
  await entry(db, { system, accepted, contributor, curator });
  await db.query(
    `insert into event (submission_id, kind, actor_id, revision, change) values ($1, 'accepted', $2, 1, 1)`,
    [accepted, curator],
  );
  await db.query(`insert into comment (submission_id, author_id, revision, text) values ($1, $2, 1, 'Good.')`, [
    accepted,
    curator,
  ]);
  return { curator, submitted, accepted, privateCheck: PRIVATE_CHECK, submissionCheck: SUBMISSION_CHECK };
}

interface Parts {
  system: string;
  accepted: string;
  contributor: string;
  curator: string;
}

async function entry(db: Client, { system, accepted, contributor, curator }: Parts): Promise<void> {
  const section = await idOf(
    db,
    `insert into section (system_id, name, formula) values ($1, 'z-27', 'z - 27') returning id`,
    [system],
  );
  await db.query('begin');
  await db.query(
    `insert into orbit (number, accession, system_id, system_version, section_id, parameters, parameter_values,
       parameters_hash, period, period_digits, returns, stability, unstable_directions, unstable_multiplier, digits,
       search_text, incipit, submission_id, contributor_id, curator_id, submitted_at)
     values (1, 'RTN-0000001X', $1, 1, $2, '{}', '{}', 'x', 1.5, 1.5, 2, 'saddle', 1, 4.7, 15, '', '[]', $3, $4, $5, now())`,
    [system, section, accepted, contributor, curator],
  );
  await db.query(
    `insert into orbit_revision (orbit_number, revision, content, check_id, why, evidence, digits)
     values (1, 1, '{}', $1, 'accepted', 're-integrated', 13)`,
    [SUBMISSION_CHECK],
  );
  await db.query('commit');
  await db.query(`insert into reference (orbit_number, revision, position, citation) values (1, 1, 1, 'A paper')`);
  await db.query(
    `insert into crossing (system_id, orbit_number, position, time, point, transversality, place)
     values ($1, 1, 1, 1.5, '{1, 2, 27}', 0.9, '(1, 2, 3)')`,
    [system],
  );
  await db.query(
    `update submission set review_state = 'accepted', decision = 'accept', decided_by = $2, decided_at = now(),
       entry_number = 1 where id = $1`,
    [accepted, curator],
  );
}

async function idOf(db: Client, sql: string, binds: unknown[] = []): Promise<string> {
  const { rows } = await db.query<{ id: string }>(sql, binds);
  return rows[0]!.id;
}
