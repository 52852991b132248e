import { View } from 'react-native';
import { entryHref } from '@/features/api/page-addresses';
import { formatSize } from '@/features/notation/format-size';
import { Heading, LinkText, Text } from '@/features/ui';
import type { CheckReport, OrbitMatch } from '@/schemas/generated/contract';

const relations: Record<OrbitMatch['relation'], string> = {
  same: 'is the same orbit',
  'same-other-start': 'is the same orbit, from another start',
  'symmetric-image': 'is its image under a symmetry',
  'multiple-of': 'is the orbit that this one repeats',
};

/** Entries that the check recognised in an orbit. */
export function MatchList({ matches }: Pick<CheckReport, 'matches'>) {
  if (matches.length === 0) return null;
  return (
    <View>
      <Heading level={3}>In the catalogue</Heading>
      {matches.map(({ accession, relation, distance, symmetry }) => (
        <Text key={`${accession}-${relation}`}>
          <LinkText href={entryHref(accession)}>{accession}</LinkText> {relations[relation]}
          {symmetry ? ` (${symmetry})` : ''}; largest distance of a crossing <Text mono>{formatSize(distance)}</Text>.
        </Text>
      ))}
    </View>
  );
}
