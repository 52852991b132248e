import { usePathname } from 'expo-router';
import type { ReactNode } from 'react';
import { useSession } from '@/features/api/session';
import { AccountMenu } from '@/features/frame/account-menu';
import { KeyHelp } from '@/features/frame/key-help';
import { PageBoundary } from '@/features/frame/page-boundary';
import { placesFor } from '@/features/frame/places-for';
import { usePlaceKeys } from '@/features/frame/use-place-keys';
import { useScrollMemory } from '@/features/frame/use-scroll-memory';
import {
  font,
  LinkText,
  LiveRegion,
  Main,
  Masthead,
  PlacesBar,
  SkipLink,
  useLayout,
  useTypingMark,
} from '@/features/ui';

/** Pages one level down whose own head takes the masthead's place on a phone. */
const OWN_HEAD = /^\/(?:orbits|desk)\/./;
const ONE_SYSTEM = /^\/systems\/./;

/** The frame of every page: skip link, masthead, places, content, live region. */
export function PageFrame({ children }: { children: ReactNode }) {
  const path = usePathname();
  const phone = useLayout() === 'phone';
  const waiting = useSession().data?.waiting ?? 0;
  const places = placesFor(path, waiting);
  useScrollMemory(path, 'content');
  usePlaceKeys();
  useTypingMark();
  return (
    <>
      <SkipLink />
      {phone && OWN_HEAD.test(path) ? null : (
        <Masthead
          places={places}
          account={<AccountMenu />}
          {...(ONE_SYSTEM.test(path) && { back: <BackToSystems /> })}
        />
      )}
      {phone ? <PlacesBar places={places} /> : null}
      <Main>
        <PageBoundary path={path}>{children}</PageBoundary>
      </Main>
      <KeyHelp />
      <LiveRegion />
    </>
  );
}

const BackToSystems = () => (
  <LinkText href="/systems" size={16} target plain>
    <span style={{ fontFamily: font.number }}>←</span> Systems
  </LinkText>
);
