import { UsersScreen } from '@/features/administration/users-screen';

export default function UsersRoute() {
  return <UsersScreen />;
}
