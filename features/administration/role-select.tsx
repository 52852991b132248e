import { View } from 'react-native';
import type { Role, User } from '@/schemas/generated/contract';
import { failureWords } from '@/features/api/failure-words';
import { useChangeUser } from '@/features/api/users';
import { Select, Text, useAnnounce } from '@/features/ui';

const roles: readonly Role[] = ['reader', 'contributor', 'curator', 'administrator'];

/** One account's role; a change holds at once and ends that account's sign-ins. */
export function RoleSelect({ user }: { user: User }) {
  const change = useChangeUser();
  const announce = useAnnounce();
  const onChange = (role: Role) =>
    change.mutate({ id: user.id, change: { role } }, { onSuccess: () => announce(`${user.name} is now ${role}.`) });
  return (
    <View style={{ minWidth: 144 }}>
      <Select
        label={`Role of ${user.name}`}
        hideLabel
        value={change.isPending ? change.variables.change.role : user.role}
        onChange={onChange}
        disabled={change.isPending}
        options={roles.map((role) => ({ value: role, label: role }))}
      />
      {change.error ? (
        <Text role="alert" size={13} tone="oxide">
          {failureWords(change.error, 'The change', '').sentence}
        </Text>
      ) : null}
    </View>
  );
}
