import { Slot } from 'expo-router';
import { DeskLayout } from '@/features/desk/lazy-desk';

export default function DeskRoutes() {
  return (
    <DeskLayout>
      <Slot />
    </DeskLayout>
  );
}
