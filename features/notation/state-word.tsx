import { Text, type TextSize } from '@/features/ui';
import { type OrbitState, stateLook } from './orbit-state';

/** The word of a state, in its colour. */
export function StateWord({ state, size }: { state: OrbitState; size?: TextSize }) {
  const { word, tone } = stateLook[state];
  return (
    <Text tone={tone} {...(size && { size })}>
      {word}
    </Text>
  );
}
