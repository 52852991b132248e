import { View } from 'react-native';
import { entryHref } from '@/features/api/page-addresses';
import { entryMusic } from '@/features/notation/entry-music';
import { formatDifference } from '@/features/notation/format-difference';
import { Incipit } from '@/features/notation/incipit';
import type { Neighbours } from '@/features/orbit/use-neighbours';
import { colour, Heading, LinkText, space, StaffLines, Text } from '@/features/ui';
import type { Entry, System } from '@/schemas/generated/contract';

/** Neighbours shown on either side. */
const SHOWN = 2;

interface NearbyProps {
  entry: Entry;
  system: System | undefined;
  neighbours: Neighbours;
}

/** Entries of the same system next to this one in period. */
export function Nearby({ entry, system, neighbours }: NearbyProps) {
  const { below, above, incipits, isPending, isError } = neighbours;
  const shown = [...below.slice(0, SHOWN).reverse(), ...above.slice(0, SHOWN)];
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>Same system, nearby in period</Heading>
      {isPending ? <StaffLines kind="loading" /> : null}
      {!isPending && shown.length === 0 ? (
        <Text tone="muted">
          {isError ? 'The neighbours did not come.' : 'No other entry of this system with these parameters.'}
        </Text>
      ) : null}
      <View role="list">
        {shown.map((other) => (
          <View
            key={other.accession}
            role="listitem"
            style={{ borderTopWidth: 1, borderColor: colour.hairline, paddingVertical: space.one }}
          >
            <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline' }}>
              <LinkText href={entryHref(other.accession)} target size={16}>
                {other.accession}
              </LinkText>
              <Difference other={other} entry={entry} />
            </View>
            <Incipit {...entryMusic(other, system, incipits[other.accession] ?? null)} space={7} />
          </View>
        ))}
      </View>
    </View>
  );
}

function Difference({ other, entry }: { other: Entry; entry: Entry }) {
  const difference = formatDifference(other.period, entry.period);
  return (
    <Text mono size={14} tone="muted" nowrap>
      {difference === '0' ? 'same ' : 'Δ'}
      <Text italic>T</Text>
      {difference === '0' ? '' : ` ${difference}`}
    </Text>
  );
}
