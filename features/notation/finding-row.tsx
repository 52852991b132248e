import type { ReactNode } from 'react';
import { View } from 'react-native';
import { colour, space, Text } from '@/features/ui';
import { Magnitude, type Relation } from './magnitude';
import { type Severity, SeverityMark } from './severity-mark';

export interface FindingRowProps {
  severity: Severity;
  code: string;
  message: ReactNode;
  value?: number | null;
  limit?: number | null;
  /** Between value and limit; which is larger unless given. */
  relation?: Relation;
  /** What one can do about it: a link or a button. */
  action?: ReactNode;
}

const relationOf = (value: number, limit: number): Relation => (value > limit ? '>' : value < limit ? '<' : '=');

function Figures({ value, limit, relation }: Pick<FindingRowProps, 'value' | 'limit' | 'relation'>) {
  if (value === null || value === undefined) return null;
  if (limit === null || limit === undefined) return <Magnitude value={value} />;
  return <Magnitude value={value} relation={relation ?? relationOf(value, limit)} limit={limit} />;
}

/** One line of a check report: severity by mark, word and colour; the code; the sentence; the figures. */
export function FindingRow(props: FindingRowProps) {
  const { severity, code, message, action } = props;
  const tone = ({ blocker: 'oxide', warning: 'ochre', note: 'muted' } as const)[severity];
  return (
    <View
      role="listitem"
      style={{
        borderTopWidth: 1,
        borderColor: colour.hairline,
        paddingVertical: space.oneHalf,
        flexDirection: 'row',
        gap: space.one,
      }}
    >
      <View style={{ paddingTop: 5 }}>
        <SeverityMark severity={severity} />
      </View>
      <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
        <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.one }}>
          <Text weight="semibold" tone={tone}>
            {severity}
          </Text>
          <Text mono size={13} tone="faint">
            {code}
          </Text>
        </View>
        <Text>{message}</Text>
        <Figures {...props} />
        {action}
      </View>
    </View>
  );
}
