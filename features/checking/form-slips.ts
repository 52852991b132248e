import type { OrbitDraft } from '@/features/checking/orbit-draft';

/** What is wrong with the form of a draft, by JSON Pointer of the body; nothing about the mathematics. */
export type Slips = Readonly<Record<string, string>>;

const NUMBER = /^[+-]?(?:[0-9]+(?:\.[0-9]+)?(?:[eE][+-]?[0-9]+)?|[0-9]+\/[0-9]+)$/;

/** 15 to 100. */
const DIGITS = /^(?:1[5-9]|[2-9][0-9]|100)$/;

const slipOfNumber = (text: string): string | null =>
  text.trim() === '' || NUMBER.test(text.trim()) ? null : 'not a number; write it like -13.76, 1.5e-3 or 8/3';

/** Slips that one sees while typing: what is no number, what is missing once others are there. */
export function formSlips(draft: OrbitDraft): Slips {
  const slips: Record<string, string> = {};
  const add = (pointer: string, slip: string | null) => {
    if (slip) slips[pointer] = slip;
  };
  const begun = draft.point.some((coordinate) => coordinate.trim() !== '');
  draft.point.forEach((coordinate, index) => {
    add(
      `/point/${index}`,
      begun && draft.period.trim() !== '' && coordinate.trim() === '' ? 'missing' : slipOfNumber(coordinate),
    );
  });
  add('/period', slipOfNumber(draft.period));
  add('/tolerance', slipOfNumber(draft.tolerance));
  const returns = draft.returns.trim();
  add('/returns', returns === '' || /^[1-9][0-9]{0,3}$/.test(returns) ? null : 'a whole number from 1 to 5000');
  const digits = draft.digits.trim();
  add('/digits', digits === '' || DIGITS.test(digits) ? null : 'a whole number from 15 to 100');
  for (const [name, value] of Object.entries(draft.parameters)) add(`/parameters/${name}`, slipOfNumber(value));
  return slips;
}
