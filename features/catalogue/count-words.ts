import type { OrbitPage } from '@/schemas/generated/contract';

const commas = new Intl.NumberFormat('en-GB');

/** A whole number in running text, with commas. */
export const wholeNumber = (value: number): string => commas.format(value);

/** "12 orbits", "1 orbit", "more than 10,000 orbits". */
export function countWords(total: OrbitPage['total']): string {
  const orbits = total.value === 1 ? '1 orbit' : `${wholeNumber(total.value)} orbits`;
  return total.relation === 'at-least' ? `more than ${orbits}` : orbits;
}

/** ", 3 up to the half-turn", where results are each other's images under a symmetry; empty where none are. */
export const symmetryWords = (upTo: OrbitPage['upToSymmetry']): string =>
  upTo ? `, ${wholeNumber(upTo.value)} up to the ${upTo.symmetries.join(' and the ')}` : '';
