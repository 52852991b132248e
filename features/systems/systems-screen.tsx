import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { useSystems } from '@/features/api/systems';
import { createSystemSearch } from '@/features/systems/search-systems';
import { SystemItem } from '@/features/systems/system-item';
import { Empty, Failure, Field, Page, space, TextButton, Text, useFuse, useLayout, Waiting } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** All systems, found by a few letters. */
export function SystemsScreen() {
  const systems = useSystems();
  return (
    <Page title="Systems">
      {systems.isPending ? <Waiting staves={4} /> : null}
      {systems.isError ? (
        <Failure
          {...failureWords(systems.error, 'The list of systems', 'Nothing was lost.')}
          onRetry={systems.refetch}
        />
      ) : null}
      {systems.data ? <SystemsFound systems={systems.data} /> : null}
    </Page>
  );
}

function SystemsFound({ systems }: { systems: System[] }) {
  const [text, setText] = useState('');
  const columns = useLayout() === 'phone' ? 1 : 2;
  const fuzzy = useFuse(text !== '');
  const search = useMemo(() => createSystemSearch(systems, fuzzy), [systems, fuzzy]);
  const found = search(text);
  return (
    <View style={{ gap: space.two }}>
      <View style={{ maxWidth: 544, width: '100%' }}>
        <Field label="Find a system" type="search" placeholder="name or equation" value={text} onChangeText={setText} />
      </View>
      <Text size={14} tone="muted">
        {found.length === systems.length ? `${systems.length} systems` : `${found.length} of ${systems.length} systems`}
      </Text>
      {found.length === 0 ? (
        <Empty actions={<TextButton onPress={() => setText('')}>See all systems</TextButton>}>
          {systems.length === 0 ? 'There are no systems yet.' : `No system is called anything like “${text}”.`}
        </Empty>
      ) : null}
      <div
        role="list"
        aria-label="Systems"
        style={{ display: 'grid', gridTemplateColumns: `repeat(${columns}, minmax(0, 1fr))`, columnGap: 64 }}
      >
        {found.map((system) => (
          <div role="listitem" key={system.slug}>
            <SystemItem system={system} />
          </div>
        ))}
      </div>
    </View>
  );
}
