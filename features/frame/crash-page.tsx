import { Button, Failure, Page } from '@/features/ui';

interface CrashPageProps {
  error: Error;
  retry: () => void;
}

/** The code of a page did not come; what fetched it keeps the failure, so only a fresh page asks again. */
const isMissingCode = ({ message }: Error): boolean => /^(?:Loading module|Failed to fetch dynamically)/.test(message);

/** In place of a page that broke, or whose code did not come. */
export function CrashPage({ error, retry }: CrashPageProps) {
  if (isMissingCode(error)) {
    return (
      <Page title="This page did not come">
        <Failure
          title="No connection"
          sentence="The archive cannot be reached, or it was renewed while you were here. What you typed is kept on this device."
          onRetry={() => window.location.reload()}
        />
      </Page>
    );
  }
  return (
    <Page title="This page broke">
      <Failure
        title="The page could not be drawn"
        sentence={`${error.message} Nothing you sent was lost.`}
        onRetry={retry}
      >
        <Button href="/">Search the catalogue</Button>
      </Failure>
    </Page>
  );
}
