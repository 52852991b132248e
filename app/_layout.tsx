import { Slot } from 'expo-router';
import { AppFrame } from '@/features/frame/app-frame';

export { CrashScreen as ErrorBoundary } from '@/features/frame/crash-screen';

export default function RootLayout() {
  return (
    <AppFrame>
      <Slot />
    </AppFrame>
  );
}
