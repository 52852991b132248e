import { View } from 'react-native';
import { LinkText, space, Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';
import { formatMultiplierSize } from './format-multiplier';
import { Incipit } from './incipit';
import type { IncipitMusic } from './incipit-props';
import { ShortDigits } from './short-digits';
import { shortItinerary } from './short-itinerary';

export interface OrbitCardProps {
  orbit: Entry;
  music: IncipitMusic;
  href: string;
  onPress?: () => void;
  selected?: boolean;
  /** At the right of the period instead of the evidence: a distance. */
  note?: string;
}

const between = {
  flexDirection: 'row',
  justifyContent: 'space-between',
  alignItems: 'baseline',
  gap: space.two,
} as const;

function Facts({ orbit, note }: Pick<OrbitCardProps, 'orbit' | 'note'>) {
  const largest = orbit.multipliers[0];
  return (
    <View>
      <View style={between}>
        <Text>
          <Text italic>T</Text>
          {'  '}
          <ShortDigits value={orbit.period} verified={orbit.evidence.digits} />
        </Text>
        <Text size={14} tone="muted" nowrap>
          {note ?? (orbit.status === 'withdrawn' ? 'withdrawn' : orbit.evidence.level)}
        </Text>
      </View>
      <View style={between}>
        <View style={{ flexShrink: 1, minWidth: 0 }}>
          <Text size={14} tone="muted" lines={2}>
            <Text italic>{orbit.system.name}</Text> · {orbit.returns} {orbit.returns === 1 ? 'return' : 'returns'} ·{' '}
            {orbit.stability}
          </Text>
        </View>
        {largest ? (
          <Text size={14} tone="muted" mono nowrap>
            |μ| {formatMultiplierSize(largest)}
          </Text>
        ) : null}
      </View>
    </View>
  );
}

/** One entry on a phone: the whole card is a link. */
export function OrbitCard({ orbit, music, href, onPress, selected, note }: OrbitCardProps) {
  return (
    <LinkText href={href} whole {...(onPress && { onPress })}>
      <div className="r-card" {...(selected && { 'data-selected': '' })}>
        <View style={between}>
          <Text weight="semibold">{orbit.accession}</Text>
          {orbit.itinerary ? (
            <Text mono size={14} tone="muted" nowrap title={orbit.itinerary}>
              {shortItinerary(orbit.itinerary)}
            </Text>
          ) : null}
        </View>
        <Incipit {...music} space={8} />
        <Facts orbit={orbit} {...(note && { note })} />
      </div>
    </LinkText>
  );
}
