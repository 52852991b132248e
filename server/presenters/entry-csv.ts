import type { Entry } from '@/schemas/generated/contract';
import { csvLine, type Cell } from '@/server/presenters/csv-line';
import type { ExportShape } from '@/server/services/export-orbits';

type Column = readonly [name: string, cell: (entry: Entry) => Cell | undefined];

/** Entries as records of RFC 4180 under one header of machine names; those of a submission's body are its members. */
export interface EntryTable {
  header: string;
  record(entry: Entry): string;
}

/** A table wide enough for the largest system of an export. */
export function entryTable(shape: ExportShape): EntryTable {
  const columns = columnsOf(shape);
  return {
    header: csvLine(columns.map(([name]) => name)),
    record: (entry) => csvLine(columns.map(([, cell]) => cell(entry) ?? null)),
  };
}

const columnsOf = ({ dimension, parameters }: ExportShape): Column[] => [
  ['accession', (entry) => entry.accession],
  ['revision', (entry) => entry.revision],
  ['status', (entry) => entry.status],
  ['system', (entry) => entry.system.slug],
  ['systemVersion', (entry) => entry.system.version],
  ['systemName', (entry) => entry.system.name],
  ...parameters.map((name): Column => [`parameters.${name}`, (entry) => valueOf(entry.parameters, name)]),
  ['section', (entry) => entry.section.name],
  ['sectionFormula', (entry) => entry.section.formula],
  ...numbered('point', dimension, (entry) => entry.point),
  ['returns', (entry) => entry.returns],
  ['period', (entry) => entry.period],
  ['returnTimes', (entry) => entry.returnTimes.join(' ')],
  ['itinerary', (entry) => entry.itinerary],
  ...multiplierColumns(dimension),
  ['unitMultipliers', (entry) => entry.unitMultipliers],
  ['stability', (entry) => entry.stability],
  ['unstableDirections', (entry) => entry.unstableDirections],
  ['smallestTransversality', (entry) => entry.smallestTransversality],
  ['closureAbsolute', (entry) => entry.closure.absolute],
  ['closureRelative', (entry) => entry.closure.relative],
  ['tolerance', (entry) => entry.closure.tolerance],
  ['verdict', (entry) => entry.verdict],
  ['evidence', (entry) => entry.evidence.level],
  ['digits', (entry) => entry.evidence.digits],
  ['engine', (entry) => entry.evidence.engine],
  ['contributor', (entry) => entry.contributor.name],
  ['curator', (entry) => entry.curator.name],
  ['submittedAt', (entry) => entry.submittedAt],
  ['acceptedAt', (entry) => entry.acceptedAt],
  [
    'references',
    (entry) => entry.references.map(({ citation, doi }) => (doi ? `${citation} doi:${doi}` : citation)).join('; '),
  ],
  ['note', (entry) => entry.note],
  ['licence', (entry) => entry.licence],
  ['caution', (entry) => entry.caution],
];

const numbered = (name: string, count: number, texts: (entry: Entry) => string[]): Column[] =>
  Array.from({ length: count }, (_, i): Column => [`${name}.${i + 1}`, (entry) => texts(entry)[i]]);

const multiplierColumns = (dimension: number): Column[] =>
  Array.from({ length: Math.max(0, dimension - 1) }, (_, i): Column[] => [
    [`multipliers.${i + 1}.re`, (entry) => entry.multipliers[i]?.re],
    [`multipliers.${i + 1}.im`, (entry) => entry.multipliers[i]?.im],
  ]).flat();

/** A parameter may have the name of a member that every object has. */
const valueOf = (parameters: Readonly<Record<string, string>>, name: string): string | undefined =>
  Object.hasOwn(parameters, name) ? parameters[name] : undefined;
