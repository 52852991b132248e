import { colour, font } from '@/features/ui';
import { cutDecimals } from './cut-decimals';
import { Digits } from './digits';

export interface ShortDigitsProps {
  value: string;
  /** Significant digits confirmed; only these are shown. */
  verified?: number;
  /** Decimals after which the number is cut. */
  decimals?: number;
}

/** A number in a list: verified digits only, cut after at most twelve decimals, "…" where more are known. */
export function ShortDigits({ value, verified, decimals }: ShortDigitsProps) {
  const { text, more } = cutDecimals(value, verified, decimals);
  return (
    <span style={{ fontFamily: font.number, whiteSpace: 'nowrap' }}>
      <Digits value={text} />
      {more ? <span style={{ fontFamily: font.reading, color: colour.muted }}>…</span> : null}
    </span>
  );
}
