import { minusSign } from './minus-sign';
import { superscript } from './superscript';

/** `a·10ⁿ` with so many significant digits, rounded. */
export function powerForm(value: number, digits: number): string {
  const [mantissa = '', exponent = '0'] = value.toExponential(digits - 1).split('e');
  return `${minusSign(mantissa)}·10${superscript(parseInt(exponent, 10))}`;
}
