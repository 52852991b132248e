import { useLocalSearchParams } from 'expo-router';
import { useSearchTrail } from '@/features/catalogue/use-search-trail';
import { OrbitScreen } from '@/features/orbit/orbit-screen';

export default function OrbitRoute() {
  const { accession, q, sort } = useLocalSearchParams<{ accession: string; q?: string; sort?: string }>();
  const trail = useSearchTrail(accession, q ?? '', sort ?? '');
  return <OrbitScreen key={accession} accession={accession} trail={trail} />;
}
