import { SystemsScreen } from '@/features/systems/systems-screen';

export default function SystemsRoute() {
  return <SystemsScreen />;
}
