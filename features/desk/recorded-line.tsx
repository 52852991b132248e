import { View } from 'react-native';
import { entryHref } from '@/features/api/page-addresses';
import { type Recorded, useDesk } from '@/features/desk/desk-context';
import { BarlineState } from '@/features/notation/barline-state';
import type { OrbitState } from '@/features/notation/orbit-state';
import { LinkText, space, Text } from '@/features/ui';

const states = { accept: 'accepted', return: 'returned', decline: 'declined' } as const satisfies Record<
  Recorded['decision'],
  OrbitState
>;

/** What was just decided, on the page of the submission that comes next. */
export function RecordedLine({ id }: { id: string }) {
  const { recorded } = useDesk();
  if (recorded?.toldOn !== id) return null;
  const { number, decision, accession } = recorded;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.oneHalf }}>
      <BarlineState key={number} state={states[decision]} lineGap={5} width={64} word={null} animate />
      <Text>
        Submission {number}
        {accession ? (
          <>
            : in the catalogue as <LinkText href={entryHref(accession)}>{accession}</LinkText>.
          </>
        ) : (
          ` is ${states[decision]}.`
        )}
      </Text>
    </View>
  );
}
