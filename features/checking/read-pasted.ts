import type { DraftBody } from '@/schemas/generated/contract';

/** What was understood of a pasted text. */
export interface Pasted {
  body: DraftBody;
  /** Names of columns or members that no orbit has. */
  leftOut: string[];
}

const members = new Set(
  'system parameters section point returns period returnTimes itinerary tolerance multipliers digits references note'.split(
    ' ',
  ),
);
const counts = new Set(['returns', 'digits']);
/** Columns of a row without a header, in order; the point's columns stand between section and returns. */
const LIST_COLUMN = /^(point|returnTimes)\.([1-9][0-9]*)$/;
const PARAMETER_COLUMN = /^parameters\.(.+)$/;

/**
 * Read a submission's body from JSON, a line of NDJSON, or two lines of CSV: names, then values.
 *
 * @returns null when it is neither.
 */
export function readPasted(text: string): Pasted | null {
  const trimmed = text.trim();
  if (trimmed.startsWith('{')) return readJson(trimmed) ?? readJson(trimmed.split('\n')[0] ?? '');
  return readRow(trimmed);
}

function readJson(text: string): Pasted | null {
  try {
    const parsed: unknown = JSON.parse(text);
    return typeof parsed === 'object' && parsed !== null ? sorted(submittedOf(parsed)) : null;
  } catch {
    return null;
  }
}

/** An entry of the catalogue carries the body as it was submitted. */
const submittedOf = (parsed: object): object =>
  'submitted' in parsed && typeof parsed.submitted === 'object' && parsed.submitted !== null
    ? parsed.submitted
    : parsed;

function sorted(given: object): Pasted {
  const entries = Object.entries(given);
  return {
    body: Object.fromEntries(entries.filter(([name]) => members.has(name))),
    leftOut: entries.map(([name]) => name).filter((name) => !members.has(name)),
  };
}

function readRow(text: string): Pasted | null {
  const [names = [], values = []] = text.split(/\r?\n/).map(splitRow);
  if (names.length < 2 || values.length === 0 || !names.includes('period')) return null;
  const body: Record<string, unknown> = {};
  const lists: Record<string, string[]> = {};
  const parameters: Record<string, string> = {};
  const leftOut: string[] = [];
  // A row of an export says how many digits are known, not how many are wanted.
  const isEntry = names.includes('accession');
  names.forEach((name, index) => {
    const value = values[index] ?? '';
    if (value === '') return;
    const [, list, place] = LIST_COLUMN.exec(name) ?? [];
    const [, parameter] = PARAMETER_COLUMN.exec(name) ?? [];
    if (list && place) (lists[list] ??= [])[parseInt(place, 10) - 1] = value;
    else if (parameter) parameters[parameter] = value;
    else if (members.has(name) && !(name === 'digits' && isEntry))
      body[name] = counts.has(name) ? parseInt(value, 10) : value;
    else leftOut.push(name);
  });
  return { body: { ...body, ...lists, ...(Object.keys(parameters).length > 0 && { parameters }) }, leftOut };
}

/** Cells of one CSV line (RFC 4180), or of one line of a spreadsheet, which copies tabs. */
function splitRow(line: string): string[] {
  if (line.includes('\t')) return line.split('\t').map((cell) => cell.trim());
  return [...line.matchAll(/(?:^|,)(?:"((?:[^"]|"")*)"|([^,]*))/g)].map(([, quoted, plain]) =>
    (quoted?.replace(/""/g, '"') ?? plain ?? '').trim(),
  );
}
