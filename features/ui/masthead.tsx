import type { ReactNode } from 'react';
import { View } from 'react-native';
import { DoubleRule } from './double-rule';
import { followLink } from './follow-link';
import { useLayout } from './layout';
import { type Place, PlaceLink } from './place-link';
import { Text } from './text';
import { contentWidth, space } from './tokens';
import { Wordmark } from './wordmark';

export interface MastheadProps {
  places: readonly Place[];
  /** At the right: the account's menu, or "Sign in". */
  account: ReactNode;
  /** Phone pages one level down show this instead of the wordmark. */
  back?: ReactNode;
}

function Name() {
  return (
    <a href="/" className="r-wordmark" aria-label="Ritornel, home" onClick={(event) => followLink(event, '/')}>
      <Wordmark />
      <Text size={23} weight="semibold">
        Ritornel
      </Text>
    </a>
  );
}

/** The top of every page: wordmark, places (wide and middle), account. */
export function Masthead({ places, account, back }: MastheadProps) {
  const layout = useLayout();
  const phone = layout === 'phone';
  const margin = { phone: space.two, middle: space.four, wide: space.eight }[layout];
  return (
    <header className={phone ? 'r-top' : 'r-masthead'}>
      <View
        style={{
          flexDirection: 'row',
          alignItems: 'center',
          gap: layout === 'wide' ? space.eight : space.three,
          height: phone ? 56 : 64,
          width: '100%',
          maxWidth: contentWidth + 2 * margin,
          alignSelf: 'center',
          paddingHorizontal: margin,
        }}
      >
        {phone && back ? back : <Name />}
        {phone ? null : (
          <nav className="r-masthead-places" aria-label="Places">
            {places.map((place) => (
              <PlaceLink key={place.href} place={place} />
            ))}
          </nav>
        )}
        <View style={{ marginLeft: 'auto' }}>{account}</View>
      </View>
      {phone ? null : <DoubleRule />}
    </header>
  );
}
