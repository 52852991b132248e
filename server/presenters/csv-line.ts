import Papa from 'papaparse';

/** What a spreadsheet would run as a formula: one of these at the beginning of a cell. */
const FORMULA = /^[=+\-@\t\r]/;
const NUMBER = /^[+-]?[0-9]+(?:\.[0-9]+)?(?:[eE][+-]?[0-9]+)?$/;

export type Cell = string | number | boolean | null;

/** One record of RFC 4180, its line end included. A cell that a spreadsheet would run is guarded by an apostrophe unless it is a number. */
export const csvLine = (cells: readonly Cell[]): string =>
  `${Papa.unparse([cells.map(guarded)], { newline: '\r\n' })}\r\n`;

const guarded = (cell: Cell): Cell =>
  typeof cell === 'string' && FORMULA.test(cell) && !NUMBER.test(cell) ? `'${cell}` : cell;
