import { randomBytes } from 'node:crypto';
import type { Pool, PoolClient } from 'pg';
import type { SubmissionBody } from '@/schemas/generated/contract';
import type { EntryContent } from '@/server/models/orbit-revision';
import { accessionOf } from '@/server/services/accession';
import { foldText } from '@/server/search/fold-text';
import { builtInSystems } from '@/server/systems/built-in-systems';
import { lorenzBody } from '@/tests/reference/orbit-body';
import type { SectionOrbit } from '@/tests/reference/load-orbits';
import { anAccount } from './test-app';

/** What differs between entries made by `addLorenzEntries`. */
export interface EntryChange {
  note?: string;
  references?: { citation: string; doi?: string }[];
  contributorId?: string;
}

const PARAMETERS = { sigma: '10', rho: '28', beta: '8/3' };
const VALUES = { sigma: 10, rho: 28, beta: 8 / 3 };
/** Sizes of the Lorenz orbit AB, in round numbers. */
const EXTENTS = [32, 44, 24];

/** Put a built-in system into the database. */
export async function addSystem(pool: Pool, slug: string): Promise<string> {
  const document = builtInSystems.find((system) => system.slug === slug);
  const client = await pool.connect();
  try {
    await client.query('begin');
    const { rows } = await client.query<{ id: string }>('insert into system (slug) values ($1) returning id', [slug]);
    await client.query('insert into system_version (system_id, version, document) values ($1, 1, $2)', [
      rows[0]!.id,
      JSON.stringify(document),
    ]);
    await client.query('commit');
    return rows[0]!.id;
  } finally {
    client.release();
  }
}

/** Entries of the Lorenz system with the figures of the reference table, as the acceptance of submissions writes them. */
export async function addLorenzEntries(
  pool: Pool,
  { systemId, orbits, change = {} }: { systemId: string; orbits: readonly SectionOrbit[]; change?: EntryChange },
): Promise<string[]> {
  const curator = await anAccount('curator', { name: 'Curator Q' });
  const contributorId = change.contributorId ?? (await anAccount('contributor', { name: 'Jana Nováková' })).id;
  const client = await pool.connect();
  try {
    await client.query('begin');
    await client.query('update system set extents = $2 where id = $1', [systemId, EXTENTS]);
    const sectionId = await namedSection(client, systemId);
    const accessions: string[] = [];
    for (const orbit of orbits) {
      accessions.push(
        await addEntry(client, { orbit, systemId, sectionId, contributorId, curatorId: curator.id, change }),
      );
    }
    await client.query('commit');
    return accessions;
  } finally {
    client.release();
  }
}

interface Parts {
  orbit: SectionOrbit;
  systemId: string;
  sectionId: string;
  contributorId: string;
  curatorId: string;
  change: EntryChange;
}

async function addEntry(client: PoolClient, parts: Parts): Promise<string> {
  const { orbit, systemId, sectionId, contributorId, curatorId, change } = parts;
  const body = { ...lorenzBody(orbit), ...(change.note && { note: change.note }) };
  const { submissionId, checkId } = await addSubmission(client, parts, body);
  const content = contentOf(orbit, body, change);
  const { rows } = await client.query<{ number: number }>(`select nextval('orbit_number')::integer as number`);
  const { number } = rows[0]!;
  const accession = accessionOf(number);
  const words = [change.note ?? '', ...(change.references ?? []).map(({ citation }) => citation), 'Jana Nováková'];
  await client.query(
    `insert into orbit (number, accession, system_id, system_version, section_id, parameters, parameter_values,
       parameters_hash, period, period_digits, returns, stability, unstable_directions, unstable_multiplier, itinerary,
       digits, search_text, incipit, submission_id, contributor_id, curator_id, submitted_at, accepted_at)
     values ($1, $2, $3, 1, $4, $5, $6, 'hash', $7::numeric::float8, $7::numeric, $8, 'saddle', 1, $9, $10,
       13, $11, $12, $13, $14, $15, now(), clock_timestamp())`,
    [
      number,
      accession,
      systemId,
      sectionId,
      JSON.stringify(PARAMETERS),
      JSON.stringify(VALUES),
      orbit.period,
      Number(orbit.n),
      Math.exp(Number(orbit.logAbsMultipliers[0])),
      orbit.code,
      foldText(words.join(' ')),
      JSON.stringify([
        [0, Number(orbit.points[0]![0])],
        [Number(orbit.period), Number(orbit.points[0]![0])],
      ]),
      submissionId,
      contributorId,
      curatorId,
    ],
  );
  await client.query(
    `insert into orbit_revision (orbit_number, revision, content, check_id, made_by, why, evidence, digits)
     values ($1, 1, $2, $3, $4, 'Accepted', 're-integrated', 13)`,
    [number, JSON.stringify(content), checkId, curatorId],
  );
  for (const [position, { citation, doi }] of (change.references ?? []).entries()) {
    await client.query(
      'insert into reference (orbit_number, revision, position, citation, doi) values ($1, 1, $2, $3, $4)',
      [number, position, citation, doi ?? null],
    );
  }
  await addCrossings(client, { systemId, number, content });
  await client.query(
    `update submission set review_state = 'accepted', decision = 'accept', decided_by = $2, decided_at = now(),
       entry_number = $3 where id = $1`,
    [submissionId, curatorId, number],
  );
  return accession;
}

async function addSubmission(
  client: PoolClient,
  { systemId, contributorId }: Parts,
  body: SubmissionBody,
): Promise<{ submissionId: string; checkId: string }> {
  const { rows } = await client.query<{ id: string }>(
    `insert into submission (owner_id, review_state, sent_at) values ($1, 'submitted', now()) returning id`,
    [contributorId],
  );
  const submissionId = rows[0]!.id;
  const text = JSON.stringify(body);
  await client.query(
    `insert into submission_revision (submission_id, revision, body, system_id, system_version, sent_at)
     values ($1, 1, $2, $3, 1, now())`,
    [submissionId, text, systemId],
  );
  const checkId = randomBytes(16).toString('base64url');
  await client.query(
    `insert into orbit_check (id, body, system_id, system_version, owner_id, submission_id, revision, state, seconds, finished_at)
     values ($1, $2, $3, 1, $4, $5, 1, 'done', 20, now())`,
    [checkId, text, systemId, contributorId, submissionId],
  );
  return { submissionId, checkId };
}

async function namedSection(client: PoolClient, systemId: string): Promise<string> {
  const { rows } = await client.query<{ id: string }>(
    `insert into section (system_id, name, formula) values ($1, 'z-27', 'z - 27')
     on conflict (system_id, name, formula) do update set formula = excluded.formula returning id`,
    [systemId],
  );
  return rows[0]!.id;
}

async function addCrossings(
  client: PoolClient,
  { systemId, number, content }: { systemId: string; number: number; content: EntryContent },
): Promise<void> {
  for (const [position, crossing] of content.crossings.entries()) {
    const point = crossing.point.map(Number);
    const place = `(${point.map((coordinate, i) => coordinate / EXTENTS[i]!).join(', ')})`;
    await client.query(
      `insert into crossing (system_id, orbit_number, position, time, point, transversality, place)
       values ($1, $2, $3, $4, $5, $6, $7)`,
      [systemId, number, position + 1, crossing.time, point, crossing.transversality, place],
    );
  }
}

function contentOf(orbit: SectionOrbit, body: SubmissionBody, change: EntryChange): EntryContent {
  const later = [...orbit.points.slice(1), orbit.points[0]!];
  let time = 0;
  return {
    point: [...orbit.points[0]!, '27'],
    period: orbit.period,
    returnTimes: orbit.times,
    crossings: later.map((point, i) => ({
      time: i === later.length - 1 ? orbit.period : String((time += Number(orbit.times[i]))),
      point: [...point, '27'],
      transversality: 0.98,
    })),
    multipliers: orbit.logAbsMultipliers.map((log, i) => ({
      re: String(Number(orbit.signs[i]) * Math.exp(Number(log))),
      im: '0',
    })),
    unitMultipliers: 1,
    exponents: orbit.logAbsMultipliers.map((log) => Number(log) / Number(orbit.period)),
    unstableDirections: 1,
    smallestTransversality: 0.94,
    extent: EXTENTS.map((size) => [-size / 2, size / 2]),
    invariants: [],
    closure: { absolute: 1.5e-14, relative: 3e-16, tolerance: 1e-9 },
    correction: null,
    verdict: 'closes',
    findings: [],
    engine: 'test',
    submitted: body,
    note: change.note ?? null,
  };
}
