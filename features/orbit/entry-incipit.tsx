import { View } from 'react-native';
import { entryMusic } from '@/features/notation/entry-music';
import { Incipit } from '@/features/notation/incipit';
import { IncipitCaption } from '@/features/orbit/incipit-caption';
import { space, useLayout } from '@/features/ui';
import type { Entry, System, Trace } from '@/schemas/generated/contract';

export interface EntryIncipitProps {
  entry: Entry;
  system: System | undefined;
  trace: Trace | null;
  selected: number | null;
  onSelect: (crossing: number) => void;
}

/** Distance of two staff lines, px. */
const SPACE = { phone: 9, middle: 11, wide: 15 } as const;

/** The incipit across the page, with letters, levels and a caption. */
export function EntryIncipit({ entry, system, trace, selected, onSelect }: EntryIncipitProps) {
  const layout = useLayout();
  const music = entryMusic(entry, system);
  const index = trace?.variables.indexOf(music.coordinate) ?? -1;
  const flow = trace && index >= 0 ? trace.times.map((time, i) => [time, trace.points[i]?.[index] ?? 0]) : null;
  return (
    <View style={{ gap: space.one }}>
      <Incipit
        {...music}
        flow={flow}
        space={SPACE[layout]}
        showLetters={music.letters !== null}
        levelLabels
        selected={selected}
        onSelect={onSelect}
      />
      <IncipitCaption entry={entry} coordinate={music.coordinate} />
    </View>
  );
}
