import { View } from 'react-native';
import { useFewOrbits } from '@/features/api/orbits';
import { entryHref } from '@/features/api/page-addresses';
import { entryMusic } from '@/features/notation/entry-music';
import { Incipit } from '@/features/notation/incipit';
import { ShortDigits } from '@/features/notation/short-digits';
import { Heading, LinkText, space, StaffLines, Text } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** The entry with the shortest period. */
export function ShortestOrbit({ system }: { system: System }) {
  const few = useFewOrbits({ system: system.slug, sort: 'period' }, 1, system.shortest !== null);
  const [entry] = few.data?.items ?? [];
  if (system.shortest === null || few.isError) return null;
  return (
    <View style={{ gap: space.half }}>
      <Heading level={2}>Shortest orbit</Heading>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.two }}>
        <LinkText href={entryHref(system.shortest)} size={16} target>
          {system.shortest}
        </LinkText>
        {entry ? (
          <Text size={14}>
            <Text italic>T</Text> <ShortDigits value={entry.period} verified={entry.evidence.digits} />
          </Text>
        ) : null}
      </View>
      {entry ? (
        <Incipit
          {...entryMusic(entry, system, few.data?.incipits?.[entry.accession] ?? null)}
          space={7.5}
          showLetters
        />
      ) : (
        <StaffLines kind="loading" />
      )}
    </View>
  );
}
