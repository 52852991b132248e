import { Text, TextButton } from '@/features/ui';
import { digitGroups } from './digit-groups';

const MOST_SHOWN = 34;

interface DigitsLeftOutProps {
  /** The longest of the numbers above. */
  value: string;
  /** All digits are shown. */
  all: boolean;
  onChange: (all: boolean) => void;
  /** What the numbers are, for the accessible name. */
  what: string;
}

/** "34 of 60 digits shown; Copy takes all." under a number that is longer, with a way to see all; nothing otherwise. */
export function DigitsLeftOut({ value, all, onChange, what }: DigitsLeftOutProps) {
  const { digits } = digitGroups(value);
  if (digits <= MOST_SHOWN) return null;
  return (
    <Text size={13} tone="muted">
      {all ? `All ${digits} digits shown. ` : `${MOST_SHOWN} of ${digits} digits shown; Copy takes all. `}
      <TextButton size={13} name={`Show ${all ? 'fewer' : 'all'} digits of the ${what}`} onPress={() => onChange(!all)}>
        {all ? 'Show fewer' : 'Show all'}
      </TextButton>
    </Text>
  );
}
