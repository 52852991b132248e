import { type ComponentProps, lazy, Suspense } from 'react';
import { PageSkeleton } from '@/features/ui';

const pages = () => import('./desk-pages');
const LazyLayout = lazy(async () => ({ default: (await pages()).DeskLayout }));
const LazyDesk = lazy(async () => ({ default: (await pages()).DeskScreen }));
const LazySubmission = lazy(async () => ({ default: (await pages()).SubmissionScreen }));

/** What all pages of the Desk share, fetched when the first one opens. */
export const DeskLayout = (props: ComponentProps<typeof LazyLayout>) => (
  <Suspense fallback={<PageSkeleton title="Desk" />}>
    <LazyLayout {...props} />
  </Suspense>
);

/** Inside the layout the code is there already. */
export { LazyDesk as DeskScreen, LazySubmission as SubmissionScreen };
