import { useLocalSearchParams } from 'expo-router';
import { ReleasesScreen } from '@/features/releases/releases-screen';

export default function ReleaseRoute() {
  const { id } = useLocalSearchParams<{ id: string }>();
  return <ReleasesScreen only={id} />;
}
