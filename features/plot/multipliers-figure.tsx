import type { ReactNode } from 'react';
import type { Multiplier } from '@/features/notation/format-multiplier';
import { Figure } from './figure';
import { multiplierText } from './multiplier-text';
import { UnitCircle } from './lazy-pictures';

export interface MultipliersFigureProps {
  multipliers: readonly Multiplier[];
  caption?: ReactNode;
  fileName: string;
}

/** The multipliers in the plane, with their table. */
export function MultipliersFigure({ multipliers, caption, fileName }: MultipliersFigureProps) {
  return (
    <Figure
      title="Multipliers"
      name="Multipliers"
      caption={caption ?? 'Distance from the centre on a log scale; the bar at 1 is the trivial one.'}
      table={{
        columns: [
          { key: 'number', head: 'No.' },
          { key: 'value', head: 'Multiplier', mono: true },
        ],
        rows: multipliers.map((multiplier, i) => ({
          key: String(i),
          cells: { number: i + 1, value: multiplierText(multiplier) },
        })),
      }}
      data={multipliers}
      fileName={fileName}
      aspect={0.72}
    >
      {(size) => <UnitCircle multipliers={multipliers} {...size} />}
    </Figure>
  );
}
