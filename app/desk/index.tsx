import { DeskScreen } from '@/features/desk/lazy-desk';

export default function DeskRoute() {
  return <DeskScreen />;
}
