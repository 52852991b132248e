import type { ReactNode } from 'react';
import { View } from 'react-native';
import { useLayout } from './layout';
import { contentWidth, space } from './tokens';
import { web } from './web';

/** What is left free under the content of a phone, so that strip and bar hide nothing. */
const FREE_UNDER_PHONE = 136;

/** The content of a page: the landmark that the skip link leads to, with the page's margins. */
export function Main({ children }: { children: ReactNode }) {
  const layout = useLayout();
  const margin = { phone: space.two, middle: space.four, wide: space.eight }[layout];
  return (
    <View
      role="main"
      {...web({ id: 'content', tabIndex: -1 })}
      style={{
        flexGrow: 1,
        width: '100%',
        maxWidth: contentWidth + 2 * margin,
        alignSelf: 'center',
        paddingHorizontal: margin,
        paddingTop: layout === 'phone' ? 0 : space.three,
        paddingBottom: layout === 'phone' ? FREE_UNDER_PHONE : space.eight,
      }}
    >
      {children}
    </View>
  );
}
