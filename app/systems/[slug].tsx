import { useLocalSearchParams } from 'expo-router';
import { SystemScreen } from '@/features/systems/system-screen';

export default function SystemRoute() {
  const { slug } = useLocalSearchParams<{ slug: string }>();
  return <SystemScreen slug={slug} />;
}
