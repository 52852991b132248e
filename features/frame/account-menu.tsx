import { router, usePathname } from 'expo-router';
import { View } from 'react-native';
import { hasRole, useSession, useSignOut } from '@/features/api/session';
import { DigestSwitch } from '@/features/frame/digest-switch';
import { initialsOf } from '@/features/frame/initials-of';
import { followLink, LinkText, Popover, space, Text, ThemeSwitch, useLayout } from '@/features/ui';
import type { User } from '@/schemas/generated/contract';

/** At the right of the masthead: "Sign in", or the person's name with what lies behind it. */
export function AccountMenu() {
  const session = useSession();
  const path = usePathname();
  const phone = useLayout() === 'phone';
  const signOut = useSignOut();
  if (!session.data) return null;
  const { user } = session.data;
  // The menu is gone when the answer comes: what follows belongs to this component.
  const leave = () => signOut.mutate(undefined, { onSuccess: () => router.replace('/') });
  if (!user) {
    return (
      <LinkText href={signInAddress(path)} target size={16}>
        Sign in
      </LinkText>
    );
  }
  return (
    <Popover
      kind="words"
      role="dialog"
      align="right"
      width={336}
      title={user.name}
      label={phone ? initialsOf(user.name) : user.name}
      name={`Account of ${user.name}`}
    >
      {(close) => <AccountItems user={user} close={close} hideName={phone} onSignOut={leave} />}
    </Popover>
  );
}

/** Sign in and come back; the pages of signing in lead home. */
function signInAddress(path: string): string {
  const isAccountPage = /^\/(?:sign-in|register|confirm|forgot|reset)$/.test(path);
  return isAccountPage || path === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(path)}`;
}

interface AccountItemsProps {
  user: User;
  close: () => void;
  hideName: boolean;
  onSignOut: () => void;
}

function AccountItems({ user, close, hideName, onSignOut }: AccountItemsProps) {
  return (
    <>
      <View style={{ paddingHorizontal: space.two, paddingTop: space.half, paddingBottom: space.one }}>
        {hideName ? null : <Text weight="semibold">{user.name}</Text>}
        <Text size={13} tone="muted">
          {user.role} · signs as “{user.name}”
        </Text>
      </View>
      <Item href="/desk" label="My submissions" detail="on the Desk" close={close} />
      <div className="r-item r-item-rule">
        <span>Theme</span>
        <ThemeSwitch />
      </div>
      <DigestSwitch />
      {hasRole(user, 'administrator') ? (
        <Item href="/administration/users" label="Administration" detail="accounts and roles" close={close} />
      ) : null}
      <button
        type="button"
        className="r-item"
        onClick={() => {
          close();
          onSignOut();
        }}
      >
        Sign out
      </button>
    </>
  );
}

function Item({ href, label, detail, close }: { href: string; label: string; detail: string; close: () => void }) {
  return (
    <a
      className="r-item r-item-rule"
      href={href}
      onClick={(event) => {
        close();
        followLink(event, href);
      }}
    >
      <span>{label}</span>
      <small>{detail}</small>
    </a>
  );
}
