import type { ErrorBoundaryProps } from 'expo-router';
import { Button, Failure, Main, Page } from '@/features/ui';

/** Shown in place of a page that broke while it was drawn. */
export function CrashScreen({ error, retry }: ErrorBoundaryProps) {
  return (
    <Main>
      <Page title="This page broke">
        <Failure
          title="The page could not be drawn"
          sentence={`${error.message} Nothing you sent was lost.`}
          onRetry={retry}
        >
          <Button href="/">Search the catalogue</Button>
        </Failure>
      </Page>
    </Main>
  );
}
