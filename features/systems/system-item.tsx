import { View } from 'react-native';
import { formatCount } from '@/features/notation/format-count';
import { completeUpTo } from '@/features/systems/complete-up-to';
import { colour, LinkText, space, Text } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** One system of the list: name, size, entries, completeness in a few words. */
export function SystemItem({ system }: { system: System }) {
  const { slug, name, dimension, entries, summary } = system;
  const upTo = completeUpTo(system);
  return (
    <LinkText whole href={`/systems/${slug}`}>
      <div className="r-system-item">
        <View style={{ borderTopWidth: 1, borderColor: colour.hairline, paddingVertical: space.oneHalf, gap: 2 }}>
          <View
            style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.two }}
          >
            <View style={{ flexShrink: 1 }}>
              <Text italic size={19}>
                {name}
              </Text>
            </View>
            <Text mono size={14} nowrap>
              {entries === 0 ? 'no orbit yet' : `${formatCount(entries)} ${entries === 1 ? 'orbit' : 'orbits'}`}
            </Text>
          </View>
          {summary ? (
            <Text size={14} tone="muted" lines={2}>
              {summary}
            </Text>
          ) : null}
          <Text size={13} tone="muted">
            {dimension} {dimension === 1 ? 'equation' : 'equations'}
            {upTo === null ? '' : ` · complete up to ${upTo} ${upTo === 1 ? 'return' : 'returns'}`}
          </Text>
        </View>
      </div>
    </LinkText>
  );
}
