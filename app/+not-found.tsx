import { usePathname } from 'expo-router';
import { NotFoundScreen } from '@/features/frame/not-found-screen';

export default function NotFoundRoute() {
  return <NotFoundScreen path={usePathname()} />;
}
