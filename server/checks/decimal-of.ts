/**
 * Write a double as the shortest decimal that reads back as the same double (at most 17 digits).
 *
 * @throws {RangeError} when the number is not finite: reports hold none.
 */
export function decimalOf(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} has no decimal form`);
  return Object.is(value, -0) ? '0' : String(value);
}
