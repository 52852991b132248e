import { useState } from 'react';
import { View } from 'react-native';
import { hasRole, useSession } from '@/features/api/session';
import { useUsers } from '@/features/api/users';
import { failureWords } from '@/features/api/failure-words';
import { Button, DataTable, Empty, Failure, Field, Page, PageSkeleton, space, Text } from '@/features/ui';
import { RoleSelect } from './role-select';

const TITLE = 'Accounts';
const columns = [
  { key: 'name', head: 'Name' },
  { key: 'email', head: 'E-mail' },
  { key: 'state', head: 'Address' },
  { key: 'role', head: 'Role' },
];

function UsersTable() {
  const [text, setText] = useState('');
  const users = useUsers(text);
  if (users.isPending) return <PageSkeleton title={TITLE} />;
  if (users.isError) {
    const words = failureWords(users.error, 'The list of accounts', 'Nothing was changed.');
    return <Failure {...words} onRetry={users.refetch} />;
  }
  const items = users.data.pages.flatMap((page) => page.items);
  return (
    <View style={{ gap: space.two }}>
      <View style={{ maxWidth: 416 }}>
        <Field label="Find by name or e-mail" type="search" value={text} onChangeText={setText} />
      </View>
      {items.length === 0 ? <Empty>No account matches these words.</Empty> : null}
      <DataTable
        caption="Accounts and their roles"
        hideCaption
        ruled
        columns={columns}
        rows={items.map((user) => ({
          key: user.id,
          cells: {
            name: user.name,
            email: user.email,
            state: user.confirmed ? 'confirmed' : 'not confirmed',
            role: <RoleSelect user={user} />,
          },
        }))}
      />
      {users.hasNextPage ? <Button onPress={() => void users.fetchNextPage()}>Show more</Button> : null}
    </View>
  );
}

/** The administrator's page: who has an account, and which role. */
export function UsersScreen() {
  const session = useSession();
  if (session.isPending) return <PageSkeleton title={TITLE} />;
  const user = session.data?.user ?? null;
  return (
    <Page title={TITLE}>
      {hasRole(user, 'administrator') ? (
        <UsersTable />
      ) : (
        <Text>
          {user
            ? `This page is for administrators. You are signed in as ${user.name}.`
            : 'This page is for administrators. Sign in first.'}
        </Text>
      )}
    </Page>
  );
}
