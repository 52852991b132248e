import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Heading, space, Text, type Tone } from '@/features/ui';
import type { Verdict as VerdictValue } from '@/schemas/generated/contract';

export interface VerdictProps {
  verdict: VerdictValue;
  /** What it means. */
  sentence?: ReactNode;
  /** At the right: the engine, "no findings". */
  aside?: ReactNode;
  /** Between heading and sentence: the incipit. */
  children?: ReactNode;
}

const look: Record<VerdictValue, { title: string; tone: Tone }> = {
  closes: { title: 'Closes', tone: 'verdigris' },
  'closes-after-correction': { title: 'Closes after correction', tone: 'verdigris' },
  'does-not-close': { title: 'Does not close', tone: 'oxide' },
  inconclusive: { title: 'Could not decide', tone: 'ochre' },
};

/** What a check says: a heading and one sentence. */
export function Verdict({ verdict, sentence, aside, children }: VerdictProps) {
  const { title, tone } = look[verdict];
  return (
    <View style={{ gap: space.one }}>
      <View
        style={{
          flexDirection: 'row',
          flexWrap: 'wrap',
          justifyContent: 'space-between',
          alignItems: 'baseline',
          columnGap: space.two,
        }}
      >
        <Heading level={2} tone={tone}>
          {title}
        </Heading>
        {typeof aside === 'string' ? (
          <Text size={14} tone="muted">
            {aside}
          </Text>
        ) : (
          aside
        )}
      </View>
      {children}
      {sentence ? <Text>{sentence}</Text> : null}
    </View>
  );
}
