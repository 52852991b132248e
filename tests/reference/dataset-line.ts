import type { CheckRequest } from '@/schemas/generated/contract';

/** One orbit of a data set: what is claimed, and what the check is to find. */
export interface DatasetOrbit {
  label: string;
  body: CheckRequest;
  /** Logarithm of the unstable multiplier's modulus; null where the line does not say. */
  logMultiplier: number | null;
}

/** A line of a table of Lorenz or Rössler orbits, long or short, with every number as its printed text. */
interface TableLine {
  code: string;
  n: string;
  period: string;
  points?: string[][];
  point?: string[];
  times?: string[];
  logAbsMultipliers?: string[];
  logAbsMultiplier?: string;
}

/** A line of an export of the catalogue, as far as it is needed. */
interface ExportLine {
  accession: string;
  submitted: CheckRequest;
  multipliers: { re: string; im: string }[];
}

const JSON_NUMBER = /(?<=[:[,])-?\d[\d.eE+-]*(?=[\],}])/g;

/**
 * Read one line: of the tables beside this file, or of an NDJSON export of the catalogue.
 *
 * @returns null for a line without an orbit: an export's last.
 * @throws {SyntaxError} when it is neither.
 */
export function readDatasetLine(line: string): DatasetOrbit | null {
  const plain = JSON.parse(line) as Record<string, unknown>;
  if (plain['end'] === true) return null;
  if ('accession' in plain) return ofExport(plain as unknown as ExportLine);
  if (!('code' in plain)) throw new SyntaxError('neither a line of a table nor of an export');
  return ofTable(JSON.parse(line.replace(JSON_NUMBER, '"$&"')) as TableLine);
}

function ofTable({
  code,
  n,
  period,
  points,
  point,
  times,
  logAbsMultipliers,
  logAbsMultiplier,
}: TableLine): DatasetOrbit {
  const [a, b] = point ?? points?.[0] ?? [];
  if (a === undefined || b === undefined) throw new SyntaxError('an orbit without a section point');
  const isLorenz = /^[AB]+$/.test(code);
  const log = logAbsMultiplier ?? logAbsMultipliers?.[0];
  return {
    label: code,
    logMultiplier: log === undefined ? null : Number(log),
    body: {
      ...(isLorenz
        ? { system: 'lorenz', section: 'z-27', point: [a, b, '27'] }
        : { system: 'rossler', section: 'y-down', point: [a, '0', b] }),
      ...{ returns: Number(n), period, itinerary: code },
      ...(times && { returnTimes: times }),
    },
  };
}

function ofExport({ accession, submitted, multipliers }: ExportLine): DatasetOrbit {
  const moduli = multipliers.map(({ re, im }) => Math.hypot(Number(re), Number(im)));
  return {
    label: accession,
    body: submitted,
    logMultiplier: moduli.length === 0 ? null : Math.log(Math.max(...moduli)),
  };
}
