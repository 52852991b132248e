import { View } from 'react-native';
import { wholeNumber } from '@/features/catalogue/count-words';
import { space, Text } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

interface SystemChipsProps {
  systems: readonly System[];
  onChoose: (text: string) => void;
}

/** Nothing typed yet: the systems that have entries, the richest first. */
export function SystemChips({ systems, onChoose }: SystemChipsProps) {
  const known = systems.filter(({ entries }) => entries > 0).sort((a, b) => b.entries - a.entries);
  if (known.length === 0) return null;
  return (
    <View
      role="group"
      aria-label="Systems"
      style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.one, paddingTop: space.half }}
    >
      {known.map(({ slug, name, entries }) => (
        <span key={slug} className="r-chip">
          <button
            type="button"
            style={{ paddingRight: 10 }}
            aria-label={`${name}, ${entries} ${entries === 1 ? 'orbit' : 'orbits'}`}
            onClick={() => onChoose(slug)}
          >
            <Text italic tone="ink">
              {name}
            </Text>{' '}
            <Text mono size={13} tone="muted">
              {wholeNumber(entries)}
            </Text>
          </button>
        </span>
      ))}
    </View>
  );
}
