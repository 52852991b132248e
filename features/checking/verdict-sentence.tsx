import type { ReactNode } from 'react';
import { formatLimit } from '@/features/notation/format-limit';
import { formatSize } from '@/features/notation/format-size';
import { Text } from '@/features/ui';
import type { CheckReport } from '@/schemas/generated/contract';

const Size = ({ value }: { value: number }) => (
  <Text mono nowrap>
    {formatSize(value)}
  </Text>
);
const Limit = ({ value }: { value: number }) => (
  <Text mono nowrap>
    {formatLimit(value)}
  </Text>
);

/** What a verdict means, in one sentence with its figures. */
export function verdictSentence({ verdict, closure, correction, findings }: CheckReport, period: string): ReactNode {
  switch (verdict) {
    case 'closes':
      return closure ? (
        <>
          Run from the point as typed it comes back within <Size value={closure.relative} />; the tolerance is{' '}
          <Limit value={closure.tolerance} />.
        </>
      ) : null;
    case 'closes-after-correction':
      return closure && correction ? (
        <>
          An orbit passes within <Size value={correction.shift} /> of the point you typed; the tolerance is{' '}
          <Limit value={closure.tolerance} />. Run as typed, its instability spreads the digits to{' '}
          <Size value={closure.relative} />.
        </>
      ) : null;
    case 'does-not-close':
      return closure ? (
        <>
          After <Text italic>T</Text> = <Text mono>{period}</Text> the orbit is <Size value={closure.relative} /> away
          from where it began, in sizes of its extents; the tolerance is <Limit value={closure.tolerance} />.
        </>
      ) : (
        'It could not be run for a whole period; the finding says why.'
      );
    case 'inconclusive':
      return `The check could not decide${findings[0] ? '; the finding says why' : ''}. This says nothing about the orbit.`;
  }
}
