import { formatSize } from './format-size';
import { superscript } from './superscript';

/** Powers of ten from here up are written as plain numbers. */
const PLAIN_FROM = 0.1;
/** Whole numbers below this are written in full. */
const WHOLE_BELOW = 1_000_000;

/** A limit: a bare power where it is one (`10⁻⁹`), whole numbers in full, else as a size. */
export function formatLimit(value: number): string {
  if (Number.isInteger(value) && Math.abs(value) < WHOLE_BELOW) return String(value).replace('-', '−');
  const exponent = Math.round(Math.log10(value));
  const isPower = value > 0 && value.toPrecision(12) === (10 ** exponent).toPrecision(12);
  if (isPower) return value >= PLAIN_FROM && value < WHOLE_BELOW ? String(value) : `10${superscript(exponent)}`;
  return formatSize(value);
}
