import { type Href, router, useLocalSearchParams } from 'expo-router';
import { useCallback } from 'react';
import { CatalogueScreen, type CatalogueScreenProps } from '@/features/catalogue/catalogue-screen';

export default function CatalogueRoute() {
  const { q, sort } = useLocalSearchParams<{ q?: string; sort?: string }>();
  const onSearch = useCallback<CatalogueScreenProps['onSearch']>((search) => router.setParams(search), []);
  const onOpen = useCallback((href: string) => router.push(href as Href), []);
  return <CatalogueScreen text={q ?? ''} sort={sort ?? ''} onSearch={onSearch} onOpen={onOpen} />;
}
