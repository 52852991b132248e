import { useLocalSearchParams } from 'expo-router';
import { SearchTrail } from '@/features/catalogue/search-trail';
import { OrbitScreen } from '@/features/orbit/orbit-screen';

export default function OrbitRoute() {
  const { accession, q, sort } = useLocalSearchParams<{ accession: string; q?: string; sort?: string }>();
  return (
    <OrbitScreen accession={accession} trail={<SearchTrail accession={accession} text={q ?? ''} sort={sort ?? ''} />} />
  );
}
