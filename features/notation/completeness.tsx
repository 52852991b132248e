import { Text } from '@/features/ui';
import { formatCount } from './format-count';
import { ParameterList } from './parameter-list';

export interface CompletenessProps {
  /** Name of the system. */
  system: string;
  parameters?: Record<string, string>;
  known: number;
  /** What its itineraries allow up to `upTo` returns; `null` where that is not known. */
  allowed?: number | null;
  upTo?: number | null;
}

/** How complete the catalogue is for a system, in one sentence. */
export function Completeness({ system, parameters, known, allowed, upTo }: CompletenessProps) {
  if (allowed === null || allowed === undefined || upTo === null || upTo === undefined) {
    return (
      <Text size={14} tone="muted">
        {formatCount(known)} {known === 1 ? 'orbit' : 'orbits'}; how many there are is not known.
      </Text>
    );
  }
  const counts = `${formatCount(known)} of ${formatCount(allowed)} orbits that its itineraries allow`;
  const returns = `${upTo} ${upTo === 1 ? 'return' : 'returns'}`;
  if (known < allowed) {
    return (
      <Text size={14} tone="muted">
        {counts} up to {returns}.
      </Text>
    );
  }
  return (
    <Text size={14} tone="muted">
      Complete for <Text italic>{system}</Text>
      {parameters && Object.keys(parameters).length > 0 ? (
        <>
          {' '}
          with <ParameterList values={parameters} />
        </>
      ) : null}{' '}
      up to {returns}: {counts}.
    </Text>
  );
}
