import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Text } from './text';
import { colour, space } from './tokens';

export interface LabelledProps {
  label: ReactNode;
  /** At the right: Copy. */
  action?: ReactNode;
  /** Hairline above. */
  ruled?: boolean;
  children: ReactNode;
}

/** A value under its label, with its action at the right. */
export function Labelled({ label, action, ruled = true, children }: LabelledProps) {
  return (
    <View
      style={{
        paddingVertical: space.oneHalf,
        gap: space.half,
        ...(ruled && { borderTopWidth: 1, borderColor: colour.hairline }),
      }}
    >
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.two }}>
        <Text size={14} tone="muted">
          {label}
        </Text>
        {action}
      </View>
      {children}
    </View>
  );
}
