import { ReleasesScreen } from '@/features/releases/releases-screen';

export default function ReleasesRoute() {
  return <ReleasesScreen />;
}
