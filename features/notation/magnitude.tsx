import { Text, type TextSize, type Tone } from '@/features/ui';
import { formatLimit } from './format-limit';
import { formatSize } from './format-size';

/** How a value stands to its limit. */
export type Relation = '≤' | '≥' | '<' | '>' | '=' | '≠';

export interface MagnitudeProps {
  /** A size, or a value already set in words or digits. */
  value: number | string;
  relation?: Relation;
  limit?: number | string;
  /** Of the value; the limit is muted. */
  tone?: Tone;
  size?: TextSize;
}

/** A size against its limit: `8.8·10⁻¹² ≤ 10⁻⁹`. */
export function Magnitude({ value, relation, limit, tone = 'ink', size }: MagnitudeProps) {
  return (
    <Text mono tone={tone} {...(size && { size })}>
      <Text nowrap>{typeof value === 'number' ? formatSize(value) : value}</Text>
      {relation && limit !== undefined ? (
        <Text tone={tone === 'ink' ? 'muted' : tone} nowrap>
          {` ${relation} ${typeof limit === 'number' ? formatLimit(limit) : limit}`}
        </Text>
      ) : null}
    </Text>
  );
}
