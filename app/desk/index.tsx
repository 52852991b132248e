import { DeskScreen } from '@/features/desk/desk-screen';

export default function DeskRoute() {
  return <DeskScreen />;
}
