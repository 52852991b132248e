import { View } from 'react-native';
import { useOrbitImages } from '@/features/api/orbits';
import { entryHref } from '@/features/api/page-addresses';
import { entryMusic } from '@/features/notation/entry-music';
import { formatDifference } from '@/features/notation/format-difference';
import { Incipit } from '@/features/notation/incipit';
import type { Neighbours } from '@/features/orbit/use-neighbours';
import { colour, Heading, LinkText, space, StaffLines, Text } from '@/features/ui';
import type { Entry, EntryImage, System } from '@/schemas/generated/contract';

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
  const images = useOrbitImages(entry.accession).data?.items ?? [];
  const shown = [...below.slice(0, SHOWN).reverse(), ...above.slice(0, SHOWN)];
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>Same system, nearby in period</Heading>
      <Images images={images} />
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
            <View
              style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.two }}
            >
              <LinkText href={entryHref(other.accession)} target size={16}>
                {other.accession}
              </LinkText>
              <Difference
                other={other}
                entry={entry}
                image={images.find(({ accession }) => accession === other.accession)}
              />
            </View>
            <Incipit {...entryMusic(other, system, incipits[other.accession] ?? null)} space={7} />
          </View>
        ))}
      </View>
    </View>
  );
}

/** The entries that are this one's images under a symmetry, wherever they are in the list below. */
function Images({ images }: { images: readonly EntryImage[] }) {
  return images.map(({ accession, symmetry }) => (
    <Text key={accession}>
      Its image under the {symmetry}: <LinkText href={entryHref(accession)}>{accession}</LinkText>
    </Text>
  ));
}

interface DifferenceProps {
  other: Entry;
  entry: Entry;
  /** The other is this entry's image. */
  image: EntryImage | undefined;
}

function Difference({ other, entry, image }: DifferenceProps) {
  const difference = formatDifference(other.period, entry.period);
  const isSame = image !== undefined || difference === '0';
  return (
    <Text mono size={14} tone="muted">
      {image ? `image under the ${image.symmetry}, ` : ''}
      {isSame ? 'same ' : 'Δ'}
      <Text italic>T</Text>
      {isSame ? '' : ` ${difference}`}
    </Text>
  );
}
