import { type ReactNode, useState } from 'react';
import { View } from 'react-native';
import { colour, space, Text } from '@/features/ui';
import { Incipit } from './incipit';
import type { IncipitMusic } from './incipit-props';

/** One staff of a score. */
export interface ScoreStaff {
  key: string;
  /** At the left: the submission's number, or the entry as a link and what it is nearest in. */
  title: ReactNode;
  /** At the right: "ΔT −1.7·10⁻¹⁰ · 6 of 20 letters differ". */
  note?: ReactNode;
  /** Rotated by its own `start`; letters that differ are in `differs`. */
  music: IncipitMusic;
}

export interface ScoreProps {
  staves: readonly ScoreStaff[];
  /** Distance of two lines, px. */
  lineGap?: number;
}

const BRACKET = 12;

/** Several orbits one below the other, joined by a bracket. */
export function Score({ staves, lineGap = 8 }: ScoreProps) {
  const [width, setWidth] = useState<number | null>(null);
  return (
    <View style={{ flexDirection: 'row' }} role="group" aria-label="Submission and nearest entries">
      <View
        aria-hidden
        style={{
          width: 6,
          marginRight: BRACKET - 6,
          borderColor: colour.ink,
          borderLeftWidth: 1.4,
          borderTopWidth: 1.4,
          borderBottomWidth: 1.4,
        }}
      />
      <View
        style={{ flexGrow: 1, flexShrink: 1, minWidth: 0, gap: space.half }}
        onLayout={(event) => setWidth(event.nativeEvent.layout.width)}
      >
        {staves.map(({ key, title, note, music }) => (
          <View key={key}>
            <View
              style={{
                flexDirection: 'row',
                flexWrap: 'wrap',
                justifyContent: 'space-between',
                alignItems: 'baseline',
                columnGap: space.two,
              }}
            >
              <Text>{title}</Text>
              {note ? (
                <Text mono size={14} tone="muted">
                  {note}
                </Text>
              ) : null}
            </View>
            {width ? <Incipit {...music} width={width} space={lineGap} showLetters={Boolean(music.letters)} /> : null}
          </View>
        ))}
      </View>
    </View>
  );
}
