import { useLocalSearchParams } from 'expo-router';
import { ConfirmScreen } from '@/features/account/confirm-screen';

export default function ConfirmRoute() {
  const { token } = useLocalSearchParams<{ token?: string }>();
  return <ConfirmScreen token={token ?? ''} />;
}
