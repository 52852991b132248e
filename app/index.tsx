import { router, useLocalSearchParams } from 'expo-router';
import { CatalogueScreen } from '@/features/catalogue/catalogue-screen';

export default function CatalogueRoute() {
  const { q, sort } = useLocalSearchParams<{ q?: string; sort?: string }>();
  return <CatalogueScreen text={q ?? ''} sort={sort ?? ''} onSearch={(search) => router.setParams(search)} />;
}
