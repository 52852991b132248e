import type { ReactNode } from 'react';
import { View } from 'react-native';
import { Page, space } from '@/features/ui';

/** A page with one narrow column: the forms of an account. */
export function AccountPage({ title, children }: { title: string; children: ReactNode }) {
  return (
    <Page title={title}>
      <View style={{ maxWidth: 416, width: '100%', gap: space.two }}>{children}</View>
    </Page>
  );
}
