import type { Entry } from '@/schemas/generated/contract';
import { csvLine, type Cell } from '@/server/presenters/csv-line';
import type { ExportShape } from '@/server/services/export-orbits';

/** Types of Frictionless Data's Table Schema; numbers are decimals of any length. */
type FieldType = 'string' | 'integer' | 'number' | 'datetime';

type Column = readonly [name: string, cell: (entry: Entry) => Cell | undefined, type?: FieldType];

/** Entries as records of RFC 4180 under one header of machine names; those of a submission's body are its members. */
export interface EntryTable {
  header: string;
  /** Name and type of each column. */
  fields: { name: string; type: FieldType }[];
  record(entry: Entry): string;
}

/** A table wide enough for the largest system of an export. */
export function entryTable(shape: ExportShape): EntryTable {
  const columns = columnsOf(shape);
  return {
    header: csvLine(columns.map(([name]) => name)),
    fields: columns.map(([name, , type = 'string']) => ({ name, type })),
    record: (entry) => csvLine(columns.map(([, cell]) => cell(entry) ?? null)),
  };
}

const columnsOf = ({ dimension, parameters }: ExportShape): Column[] => [
  ['accession', (entry) => entry.accession],
  ['revision', (entry) => entry.revision, 'integer'],
  ['status', (entry) => entry.status],
  ['system', (entry) => entry.system.slug],
  ['systemVersion', (entry) => entry.system.version, 'integer'],
  ['systemName', (entry) => entry.system.name],
  ...parameters.map((name): Column => [`parameters.${name}`, (entry) => valueOf(entry.parameters, name)]),
  ['section', (entry) => entry.section.name],
  ['sectionFormula', (entry) => entry.section.formula],
  ...numbered('point', dimension, (entry) => entry.point),
  ['returns', (entry) => entry.returns, 'integer'],
  ['period', (entry) => entry.period, 'number'],
  ['returnTimes', (entry) => entry.returnTimes.join(' ')],
  ['itinerary', (entry) => entry.itinerary],
  ...multiplierColumns(dimension),
  ['unitMultipliers', (entry) => entry.unitMultipliers, 'integer'],
  ['stability', (entry) => entry.stability],
  ['unstableDirections', (entry) => entry.unstableDirections, 'integer'],
  ['smallestTransversality', (entry) => entry.smallestTransversality, 'number'],
  ['closureAbsolute', (entry) => entry.closure.absolute, 'number'],
  ['closureRelative', (entry) => entry.closure.relative, 'number'],
  ['tolerance', (entry) => entry.closure.tolerance, 'number'],
  ['verdict', (entry) => entry.verdict],
  ['evidence', (entry) => entry.evidence.level],
  ['digits', (entry) => entry.evidence.digits, 'integer'],
  ['engine', (entry) => entry.evidence.engine],
  ['contributor', (entry) => entry.contributor.name],
  ['curator', (entry) => entry.curator.name],
  ['submittedAt', (entry) => entry.submittedAt, 'datetime'],
  ['acceptedAt', (entry) => entry.acceptedAt, 'datetime'],
  [
    'references',
    (entry) => entry.references.map(({ citation, doi }) => (doi ? `${citation} doi:${doi}` : citation)).join('; '),
  ],
  ['note', (entry) => entry.note],
  ['licence', (entry) => entry.licence],
  ['caution', (entry) => entry.caution],
];

const numbered = (name: string, count: number, texts: (entry: Entry) => string[]): Column[] =>
  Array.from({ length: count }, (_, i): Column => [`${name}.${i + 1}`, (entry) => texts(entry)[i], 'number']);

const multiplierColumns = (dimension: number): Column[] =>
  Array.from({ length: Math.max(0, dimension - 1) }, (_, i): Column[] => [
    [`multipliers.${i + 1}.re`, (entry) => entry.multipliers[i]?.re, 'number'],
    [`multipliers.${i + 1}.im`, (entry) => entry.multipliers[i]?.im, 'number'],
  ]).flat();

/** A parameter may have the name of a member that every object has. */
const valueOf = (parameters: Readonly<Record<string, string>>, name: string): string | undefined =>
  Object.hasOwn(parameters, name) ? parameters[name] : undefined;
