import { countWord } from '@/features/notation/count-word';
import { multiplierSize } from '@/features/notation/format-multiplier';
import { Formula } from '@/features/notation/formula';
import { mathName } from '@/features/notation/math-name';
import { Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

/** Multipliers smaller than this are "far inside". */
const FAR_INSIDE = 1e-3;
/** Within this of 1 a multiplier is on the circle. */
const ON_CIRCLE = 1e-6;

/** What the incipit of an entry shows, in words. */
export function IncipitCaption({ entry, coordinate }: { entry: Entry; coordinate: string }) {
  const name = <Text italic>{mathName(coordinate)}</Text>;
  const count = entry.crossings.length;
  return (
    <Text size={14} tone="muted">
      {capital(countWord(count))} {count === 1 ? 'crossing' : 'crossings'} of{' '}
      <Formula text={entry.section.formula} tone="muted" /> = 0 at the height of {name}
      {count === 1 ? '; the hairline is ' : ', spaced by their return times; the hairline is '}
      {name} {count === 1 ? 'over one period' : 'between them'}. {circleSentence(entry.multipliers)}
    </Text>
  );
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

/** "One multiplier outside the circle, one far inside it." */
function circleSentence(multipliers: Entry['multipliers']): string {
  const sizes = multipliers.map(multiplierSize);
  const groups = [
    { count: sizes.filter((size) => size > 1 + ON_CIRCLE).length, where: 'outside the circle' },
    { count: sizes.filter((size) => Math.abs(size - 1) <= ON_CIRCLE).length, where: 'on the circle' },
    { count: sizes.filter((size) => size < 1 - ON_CIRCLE && size >= FAR_INSIDE).length, where: 'inside the circle' },
    { count: sizes.filter((size) => size < FAR_INSIDE).length, where: 'far inside the circle' },
  ].filter(({ count }) => count > 0);
  if (groups.length === 0) return '';
  const words = groups.map(({ count, where }, index) => {
    const noun = index > 0 ? '' : count === 1 ? ' multiplier' : ' multipliers';
    return `${countWord(count)}${noun} ${index > 0 ? where.replace('the circle', 'it') : where}`;
  });
  return `${capital(words.join(', '))}.`;
}
