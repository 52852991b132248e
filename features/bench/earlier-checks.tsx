import { View } from 'react-native';
import { useCheck } from '@/features/api/checks';
import type { Tried } from '@/features/bench/use-bench';
import type { OrbitDraft } from '@/features/checking/orbit-draft';
import { StateWord } from '@/features/notation/state-word';
import { colour, Heading, space, Text, TextButton } from '@/features/ui';

interface Props {
  tried: readonly Tried[];
  onOpen: (draft: OrbitDraft) => void;
}

/** Checks of this visit before the last one, newest first. */
export function EarlierChecks({ tried, onOpen }: Props) {
  if (tried.length === 0) return null;
  return (
    <View>
      <Heading level={2}>Before</Heading>
      <View role="list">
        {tried.map((one) => (
          <Earlier key={one.id} tried={one} onOpen={onOpen} />
        ))}
      </View>
    </View>
  );
}

function Earlier({ tried: { id, draft }, onOpen }: { tried: Tried; onOpen: (draft: OrbitDraft) => void }) {
  const check = useCheck(id);
  return (
    <View
      role="listitem"
      style={{
        flexDirection: 'row',
        flexWrap: 'wrap',
        alignItems: 'baseline',
        justifyContent: 'space-between',
        columnGap: space.two,
        borderTopWidth: 1,
        borderColor: colour.hairline,
      }}
    >
      <Text>
        {draft.system} <Text mono>T {draft.period}</Text>
      </Text>
      {check.data?.verdict ? <StateWord state={check.data.verdict} /> : <Text tone="muted">under way</Text>}
      <TextButton onPress={() => onOpen(draft)}>Open again</TextButton>
    </View>
  );
}
