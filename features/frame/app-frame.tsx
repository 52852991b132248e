import { QueryClientProvider } from '@tanstack/react-query';
import { type ReactNode, useState } from 'react';
import { createQueryClient } from '@/features/api/query-client';
import { PageFrame } from '@/features/frame/page-frame';

/** Everything around a page: the cache of answers, masthead and places. */
export function AppFrame({ children }: { children: ReactNode }) {
  const [cache] = useState(createQueryClient);
  return (
    <QueryClientProvider client={cache}>
      <PageFrame>{children}</PageFrame>
    </QueryClientProvider>
  );
}
