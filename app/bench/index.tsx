import { useLocalSearchParams } from 'expo-router';
import { BenchScreen } from '@/features/bench/bench-screen';

export default function BenchRoute() {
  const { system, from } = useLocalSearchParams<{ system?: string; from?: string }>();
  return <BenchScreen key={`${system ?? ''} ${from ?? ''}`} system={system ?? null} from={from ?? null} />;
}
