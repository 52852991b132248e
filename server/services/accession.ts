const PREFIX = 'RTN-';
const DIGITS = 7;
/** ISO 7064 MOD 11-2: modulus, radix, and the sum a right accession has. */
const MODULUS = 11;
const RADIX = 2;
const TEN = 10;
const FORM = /^RTN-?([0-9]{7})([0-9X])$/i;

/** What a typed accession turns out to be. */
export type ReadAccession =
  | { ok: true; accession: string }
  | { ok: false; reason: 'form' }
  | { ok: false; reason: 'check-character'; right: string };

/** The ISO 7064 MOD 11-2 check character of a string of digits. */
export function checkCharacter(digits: string): string {
  let sum = 0;
  for (const digit of digits) sum = ((sum + parseInt(digit, 10)) * RADIX) % MODULUS;
  const check = (MODULUS + 1 - sum) % MODULUS;
  return check === TEN ? 'X' : String(check);
}

/**
 * The accession of an entry: `RTN-`, seven digits, a check character. Entry 17 is `RTN-00000175`.
 *
 * @throws {RangeError} when the number is not whole, not positive or has more than seven digits.
 */
export function accessionOf(number: number): string {
  const digits = String(number).padStart(DIGITS, '0');
  if (!Number.isInteger(number) || number < 1 || digits.length > DIGITS) {
    throw new RangeError(`${number} is not the number of an entry`);
  }
  return PREFIX + digits + checkCharacter(digits);
}

/** Read an accession as somebody typed it: small letters and a missing hyphen are forgiven, a wrong check character is named. */
export function readAccession(typed: string): ReadAccession {
  const [, digits, check] = FORM.exec(typed.trim()) ?? [];
  if (digits === undefined || check === undefined) return { ok: false, reason: 'form' };
  const accession = PREFIX + digits + checkCharacter(digits);
  return accession.endsWith(check.toUpperCase())
    ? { ok: true, accession }
    : { ok: false, reason: 'check-character', right: accession };
}
