import { BenchScreen } from '@/features/bench/bench-screen';

export default function BenchRoute() {
  return <BenchScreen />;
}
