/**
 * Cut a positive decimal to some decimals, away from a range that is to be widened: down to the nearest below,
 * or up to the nearest above. Works on the digits; nothing is rounded through a double.
 */
export function roundOutwards(value: string, decimals: number, direction: 'down' | 'up'): string {
  const [whole = '0', fraction = ''] = value.split('.');
  if (!/^\d+$/.test(whole) || !/^\d*$/.test(fraction)) return value;
  const kept = BigInt(whole + fraction.padEnd(decimals, '0').slice(0, decimals));
  const isCut = /[1-9]/.test(fraction.slice(decimals));
  const digits = String(direction === 'up' && isCut ? kept + 1n : kept).padStart(decimals + 1, '0');
  return decimals === 0 ? digits : `${digits.slice(0, -decimals)}.${digits.slice(-decimals)}`;
}
