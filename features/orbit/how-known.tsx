import { View } from 'react-native';
import { formatSize } from '@/features/notation/format-size';
import { MoreDigits } from '@/features/orbit/more-digits';
import { Heading, space, Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

/** How the entry is known, in a sentence or two, and how to have it known better. */
export function HowKnown({ entry }: { entry: Entry }) {
  const { held, obstacle } = entry.evidence;
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>How it is known</Heading>
      <Text>
        <Evidence entry={entry} />
        {held === null ? '' : ` It is one of a family; what is held is ${held}.`}
        {entry.verdict === 'closes-after-correction'
          ? ' An orbit lies within the tolerance of what was typed; its instability spreads the typed digits further.'
          : ''}
      </Text>
      {obstacle ? (
        <Text tone="muted">
          {obstacle.digits} digits were tried and not reached: {inSentence(obstacle.message)}
        </Text>
      ) : null}
      <MoreDigits entry={entry} />
    </View>
  );
}

/** A sentence as the end of another. */
const inSentence = (sentence: string): string => sentence.charAt(0).toLowerCase() + sentence.slice(1);

function Evidence({ entry }: { entry: Entry }) {
  const { level, digits } = entry.evidence;
  const size = <Text mono>{formatSize(entry.closure.absolute)}</Text>;
  switch (level) {
    case 're-integrated':
      return (
        <>
          <Text weight="semibold">Re-integrated.</Text> Closes to {size} here; {digits} digits confirmed.
        </>
      );
    case 'refined':
      return (
        <>
          <Text weight="semibold">Refined</Text> to {digits} digits. As typed it closes to {size} here.
        </>
      );
    case 'proved':
      return (
        <>
          <Text weight="semibold">Proved.</Text> Exactly one orbit closes near these crossings. Digits refined to{' '}
          {digits}; later ones as submitted.
        </>
      );
  }
}
