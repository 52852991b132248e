const SIGNS: Record<string, string> = { '-': '⁻', '+': '⁺' };
const DIGITS = ['⁰', '¹', '²', '³', '⁴', '⁵', '⁶', '⁷', '⁸', '⁹'];

/** An integer as superscript characters. */
export const superscript = (exponent: number): string =>
  Array.from(String(exponent))
    .map((sign) => SIGNS[sign] ?? DIGITS[parseInt(sign, 10)])
    .join('');
