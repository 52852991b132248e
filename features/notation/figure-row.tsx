import type { ReactNode } from 'react';
import { View } from 'react-native';
import { colour, space, Text } from '@/features/ui';
import { formatLimit } from './format-limit';
import { formatSize } from './format-size';
import { Magnitude, type Relation } from './magnitude';

export interface FigureRowProps {
  name: ReactNode;
  value: number | string;
  relation?: Relation;
  limit?: number | string;
  /** Value and limit together at the right edge; without it limits stand in a column of their own. */
  compact?: boolean;
  /** A stale report. */
  muted?: boolean;
  ruled?: boolean;
}

/** Width of the column of limits, px. */
const LIMIT_WIDTH = 84;

function Aligned({ value, relation, limit, muted }: FigureRowProps) {
  return (
    <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: space.one }}>
      <Text mono size={14} tone={muted ? 'muted' : 'ink'} nowrap>
        {typeof value === 'number' ? formatSize(value) : value}
      </Text>
      <View style={{ width: LIMIT_WIDTH }}>
        {relation && limit !== undefined ? (
          <Text mono size={14} tone="muted" nowrap>
            {`${relation} ${typeof limit === 'number' ? formatLimit(limit) : limit}`}
          </Text>
        ) : null}
      </View>
    </View>
  );
}

/** One figure of a report: its name, its value, its limit. */
export function FigureRow(props: FigureRowProps) {
  const { name, value, relation, limit, compact, muted, ruled = true } = props;
  return (
    <View
      style={{
        flexDirection: 'row',
        justifyContent: 'space-between',
        alignItems: 'baseline',
        gap: space.two,
        paddingVertical: 5,
        ...(ruled && { borderTopWidth: 1, borderColor: colour.hairline }),
      }}
    >
      <View style={{ flexShrink: 1 }}>
        <Text size={14} tone={muted ? 'muted' : 'ink'}>
          {name}
        </Text>
      </View>
      {compact ? (
        <Magnitude
          value={value}
          size={14}
          tone={muted ? 'muted' : 'ink'}
          {...(relation && { relation })}
          {...(limit !== undefined && { limit })}
        />
      ) : (
        <Aligned {...props} />
      )}
    </View>
  );
}
