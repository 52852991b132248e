/** A decimal number taken apart, digits untouched. */
export interface DecimalParts {
  sign: '' | '-';
  whole: string;
  fraction: string;
  exponent: number;
}

const DECIMAL = /^\s*([+\-−]?)(\d*)(?:\.(\d*))?(?:[eE]([+\-−]?\d+))?\s*$/;

/** Take a decimal string apart; null when it is not one (`8/3`, words). */
export function decimalParts(text: string): DecimalParts | null {
  const found = DECIMAL.exec(text);
  if (!found) return null;
  const [, sign, whole = '', fraction = '', exponent = '0'] = found;
  if (whole === '' && fraction === '') return null;
  return {
    sign: sign === '-' || sign === '−' ? '-' : '',
    whole: whole === '' ? '0' : whole,
    fraction,
    exponent: parseInt(exponent.replace('−', '-'), 10),
  };
}
