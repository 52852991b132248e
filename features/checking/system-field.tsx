import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { Field, space, Text, TextButton, useFuse } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

interface Props {
  systems: readonly System[];
  value: string;
  onChange: (system: System) => void;
  error?: string | null;
}

/** Matches shown under the field. */
const SHOWN = 6;
/** How far a word may be from what it finds: 0 is the same, 1 anything. */
const FUZZINESS = 0.4;

/** Choose a system by typing a part of its name. */
export function SystemField({ systems, value, onChange, error = null }: Props) {
  const chosen = systems.find(({ slug }) => slug === value);
  const [text, setText] = useState<string | null>(null);
  const Fuse = useFuse(text !== null && text.trim() !== '');
  const found = useMemo(() => {
    const wanted = text?.trim() ?? '';
    if (wanted === '') return systems;
    if (Fuse)
      return new Fuse(systems, { keys: ['name', 'slug', 'summary'], threshold: FUZZINESS })
        .search(wanted)
        .map(({ item }) => item);
    return systems.filter(({ name }) => name.toLowerCase().includes(wanted.toLowerCase()));
  }, [systems, text, Fuse]);
  const take = (system: System) => {
    setText(null);
    onChange(system);
  };
  return (
    <View>
      <Field
        label="System"
        value={text ?? chosen?.name ?? value}
        onChangeText={setText}
        placeholder="such as Lorenz"
        error={error}
        hint={text === null && chosen ? (chosen.summary ?? '') : null}
        onKeyDown={(event) => {
          const [first] = found;
          if (event.key === 'Enter' && text !== null && first) {
            event.preventDefault();
            take(first);
          } else if (event.key === 'Escape') setText(null);
        }}
      />
      {text === null ? null : (
        <View
          role="list"
          aria-label="Systems found"
          style={{ flexDirection: 'row', flexWrap: 'wrap', columnGap: space.two }}
        >
          {found.length === 0 ? <Text size={14}>No system has such a name.</Text> : null}
          {found.slice(0, SHOWN).map((system) => (
            <View key={system.slug} role="listitem">
              <TextButton size={14} onPress={() => take(system)}>
                {system.name}
              </TextButton>
            </View>
          ))}
        </View>
      )}
    </View>
  );
}
