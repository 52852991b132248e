import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { SubmissionBody } from '@/schemas/generated/contract';
import { imageCrossings } from '@/server/checks/image-crossings';
import { TOLERANCE_DEFAULT } from '@/server/checks/limits';
import { sameCrossings } from '@/server/checks/same-crossings';
import type { EntryContent } from '@/server/models/orbit-revision';
import type { ClosedReport } from '@/server/services/entry-figures';
import type { KnownSystem } from '@/server/services/known-system';
import { numberOf, parametersOf } from '@/server/services/parameters-of';

/** Periods of an orbit and its image, corrected apart, differ by less than this share. */
const PERIOD_WINDOW = 1e-6;

interface Accepted {
  system: KnownSystem;
  body: SubmissionBody;
  report: ClosedReport;
}

interface Candidate {
  number: number;
  content: EntryContent;
}

/**
 * Note which entries a new one is the image of under a symmetry of its system, both ways round.
 *
 * Acceptances into one system pass one at a time, so of two images the later one always finds the earlier. An image is
 * found where the symmetry maps the section onto itself, so that crossings go over into crossings.
 */
export async function recordImages(
  db: Sequelize,
  number: number,
  { system, body, report }: Accepted,
  transaction: Transaction,
): Promise<void> {
  const { symmetries, variables } = system.checked;
  if (symmetries.length === 0) return;
  const { orbit } = report;
  const parameters = new Map(Object.entries(parametersOf(system.checked, body.parameters).values));
  const tolerance = body.tolerance === undefined ? TOLERANCE_DEFAULT : numberOf(body.tolerance).value;
  const moduli = variables.map(({ modulus }) => modulus);
  const points = orbit.crossings.map(({ point }) => point);
  const candidates = await entriesOfThisPeriod(db, number, transaction);
  for (const { number: other, content } of candidates) {
    const others = content.crossings.map(({ point }) => point);
    const found = symmetries.find((symmetry) => {
      const images = imageCrossings(points, system.checked, symmetry, parameters);
      return sameCrossings({ points: others, extent: content.extent, tolerance }, { points: images }, moduli);
    });
    if (!found) continue;
    await db.query('insert into orbit_image (orbit_number, image_number, symmetry) values ($1, $2, $3), ($2, $1, $3)', {
      bind: [number, other, found.name],
      transaction,
    });
  }
}

const entriesOfThisPeriod = (db: Sequelize, number: number, transaction: Transaction): Promise<Candidate[]> =>
  db.query<Candidate>(
    `select o.number, r.content from orbit n
     join orbit o on o.system_id = n.system_id and o.parameters_hash = n.parameters_hash
       and o.section_id = n.section_id and o.returns = n.returns and o.number <> n.number
       and o.period between n.period * (1 - $2::float8) and n.period * (1 + $2::float8)
     join orbit_revision r on r.orbit_number = o.number and r.revision = o.revision
     where n.number = $1`,
    { bind: [number, PERIOD_WINDOW], type: QueryTypes.SELECT, transaction },
  );
