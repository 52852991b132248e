import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';
import type { SubmissionBody } from '@/schemas/generated/contract';
import type { CheckedSection } from '@/server/formulas/checked-system';
import { Crossing } from '@/server/models/crossing';
import { Orbit } from '@/server/models/orbit';
import { OrbitRevision } from '@/server/models/orbit-revision';
import { Reference } from '@/server/models/reference';
import { Section } from '@/server/models/section';
import type { Submission } from '@/server/models/submission';
import { System } from '@/server/models/system';
import { User } from '@/server/models/user';
import { foldText } from '@/server/search/fold-text';
import { accessionOf } from '@/server/services/accession';
import {
  type ClosedReport,
  crossingPlace,
  entryContent,
  evidenceOf,
  largestModulus,
  orbitExtents,
} from '@/server/services/entry-figures';
import type { KnownSystem } from '@/server/services/known-system';
import { numberOf, parametersOf } from '@/server/services/parameters-of';
import { queueRefinement } from '@/server/services/queue-refinement';
import { recordImages } from '@/server/services/record-images';
import { DIGITS_OF_EVERY_ENTRY } from '@/server/services/refinement-limits';

/** Everything an entry is made of. */
export interface EntryParts {
  submission: Submission;
  curatorId: string;
  checkId: string;
  body: SubmissionBody;
  system: KnownSystem;
  section: CheckedSection;
  report: ClosedReport;
  /** `[time, value]` pairs for the section's staff. */
  incipit: number[][];
}

/**
 * Write an entry: its row, first revision, references and crossings, and queue its refinement.
 *
 * @returns its number.
 */
export async function createEntry(db: Sequelize, parts: EntryParts, transaction: Transaction): Promise<number> {
  const { submission, curatorId, checkId, body, report } = parts;
  const [next] = await db.query<{ number: number }>(`select nextval('orbit_number')::integer as number`, {
    type: QueryTypes.SELECT,
    transaction,
  });
  const { number } = next!;
  await createRow(number, parts, transaction);
  const content = entryContent(report, body);
  const why = `Accepted as submission ${submission.number}.`;
  await OrbitRevision.create(
    { orbitNumber: number, revision: 1, content, checkId, madeBy: curatorId, why, ...evidenceOf(report) },
    { transaction },
  );
  await Reference.bulkCreate(
    (body.references ?? []).map(({ citation, doi }, index) => ({
      ...{ orbitNumber: number, revision: 1, position: index + 1 },
      ...{ citation, doi: doi ?? null },
    })),
    { transaction },
  );
  await createCrossings(number, parts, transaction);
  await recordImages(db, number, parts, transaction);
  if (evidenceOf(report).digits < DIGITS_OF_EVERY_ENTRY) {
    await queueRefinement(db, { orbitNumber: number, digits: DIGITS_OF_EVERY_ENTRY, askedBy: null }, transaction);
  }
  return number;
}

async function createRow(number: number, parts: EntryParts, transaction: Transaction): Promise<void> {
  const { submission, system, body, report } = parts;
  const { orbit } = report;
  const { texts, values, hash } = parametersOf(system.checked, body.parameters);
  const accession = accessionOf(number);
  const contributor = await User.findByPk(submission.ownerId, { rejectOnEmpty: true, transaction });
  await Orbit.create(
    {
      ...{ number, accession, systemId: system.id, systemVersion: system.version },
      sectionId: await sectionId(system, parts.section, transaction),
      ...{ parameters: texts, parameterValues: values, parametersHash: hash },
      ...{ period: numberOf(orbit.period).value, periodDigits: orbit.period, returns: orbit.returns },
      ...{ stability: orbit.stability, unstableDirections: orbit.unstableDirections },
      ...{ unstableMultiplier: largestModulus(orbit), itinerary: orbit.itinerary },
      ...evidenceOf(report),
      searchText: searchText(parts, accession, contributor.name),
      incipit: parts.incipit,
      ...{ submissionId: submission.id, contributorId: contributor.id, curatorId: parts.curatorId },
      submittedAt: submission.sentAt!,
    },
    { transaction },
  );
}

/** Every word by which somebody may look for the entry. */
function searchText({ system, section, body, report }: EntryParts, accession: string, contributor: string): string {
  const { name } = system.checked.document;
  const sources = (body.references ?? []).flatMap(({ citation, doi }) => [citation, doi ?? '']);
  const words = [accession, system.slug, name, section.name ?? '', report.orbit.itinerary ?? '', contributor];
  return foldText([...words, body.note ?? '', ...sources].filter(Boolean).join('\n'));
}

async function sectionId(
  { id: systemId }: KnownSystem,
  { name, formula }: CheckedSection,
  transaction: Transaction,
): Promise<string> {
  const [section] = await Section.findOrCreate({ where: { systemId, name, formula }, transaction });
  return section.id;
}

async function createCrossings(orbitNumber: number, parts: EntryParts, transaction: Transaction): Promise<void> {
  const { system, report } = parts;
  const row = await System.findByPk(system.id, { rejectOnEmpty: true, transaction });
  if (row.extents === null) await row.update({ extents: orbitExtents(report.orbit, system.checked) }, { transaction });
  const extents = row.extents!;
  await Crossing.bulkCreate(
    report.orbit.crossings.map(({ time, point: decimals, transversality }, index) => {
      const point = decimals.map((decimal) => numberOf(decimal).value);
      const place = crossingPlace(point, extents, system.checked);
      const figures = { time: numberOf(time).value, point, transversality, place };
      return { systemId: system.id, orbitNumber, position: index + 1, ...figures };
    }),
    { transaction },
  );
}
