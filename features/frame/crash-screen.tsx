import type { ErrorBoundaryProps } from 'expo-router';
import { CrashPage } from '@/features/frame/crash-page';
import { Main } from '@/features/ui';

/** Shown in place of everything when the frame itself broke. */
export function CrashScreen({ error, retry }: ErrorBoundaryProps) {
  return (
    <Main>
      <CrashPage error={error} retry={() => void retry()} />
    </Main>
  );
}
