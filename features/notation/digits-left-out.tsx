import { Text } from '@/features/ui';
import { digitGroups } from './digit-groups';

const MOST_SHOWN = 34;

/** "34 of 42 digits shown; Copy takes all." under a number that is longer than what is shown; nothing otherwise. */
export function DigitsLeftOut({ value }: { value: string }) {
  const { digits } = digitGroups(value);
  if (digits <= MOST_SHOWN) return null;
  return (
    <Text size={13} tone="muted">
      {MOST_SHOWN} of {digits} digits shown; Copy takes all.
    </Text>
  );
}
