import { formatCount } from './format-count';

const WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

/** A count in words up to twelve, in digits beyond. */
export const countWord = (count: number): string => WORDS[count] ?? formatCount(count);
