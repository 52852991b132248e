import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from './text';
import { colour, space } from './tokens';

export interface DefinitionRow {
  name: string;
  value: ReactNode;
}

export interface DefinitionRowsProps {
  rows: readonly DefinitionRow[];
  /** Width of the names, px. */
  nameWidth?: number;
  /** Hairlines between rows. */
  ruled?: boolean;
}

/** Names at the left, what they are at the right. */
export function DefinitionRows({ rows, nameWidth = 112, ruled = false }: DefinitionRowsProps) {
  const line = ruled ? { borderTopWidth: 1, borderColor: colour.hairline, paddingVertical: 7 } : { paddingVertical: 2 };
  return (
    <View>
      {rows.map(({ name, value }) => (
        <View key={name} style={[{ flexDirection: 'row', alignItems: 'baseline', gap: space.one }, line]}>
          <View style={{ width: nameWidth, flexShrink: 0 }}>
            <Text size={14} tone="muted">
              {name}
            </Text>
          </View>
          <View style={{ flexGrow: 1, flexShrink: 1, minWidth: 0 }}>
            {typeof value === 'string' ? <Text>{value}</Text> : value}
          </View>
        </View>
      ))}
    </View>
  );
}
