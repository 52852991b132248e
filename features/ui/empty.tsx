import type { ReactNode } from 'react';
import { View } from 'react-native';
import { StaffLines } from './staff-lines';
import { Text } from './text';
import { space } from './tokens';

export interface EmptyProps {
  /** What was not found, and why; a sentence. */
  children: ReactNode;
  /** What one can do next. */
  actions?: ReactNode;
}

/** Nothing to show: five lines, no clef, no bar, and a sentence. */
export function Empty({ children, actions }: EmptyProps) {
  return (
    <View style={{ gap: space.two, paddingVertical: space.two, maxWidth: 544 }}>
      <StaffLines kind="empty" />
      <Text>{children}</Text>
      {actions ? <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>{actions}</View> : null}
    </View>
  );
}
