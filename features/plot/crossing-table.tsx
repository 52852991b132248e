import { mathName } from '@/features/notation/math-name';
import { Text } from '@/features/ui';
import { extremeText } from './extreme-text';
import type { FigureTable } from './figure';
import type { TraceCrossing } from './trace-crossings';

/** A variable at the head of a column. */
const head = (name: string) => (
  <Text italic smallCaps={false} size={14} tone="muted">
    {mathName(name)}
  </Text>
);

/** The table of a trace's crossings: number, time, coordinates. */
export function crossingTable(variables: readonly string[], crossings: readonly TraceCrossing[]): FigureTable {
  return {
    columns: [
      { key: 'number', head: 'No.' },
      { key: 'time', head: head('t'), mono: true },
      ...variables.map((name) => ({ key: `v-${name}`, head: head(name), mono: true })),
    ],
    rows: crossings.map(({ time, point }, i) => ({
      key: String(i),
      cells: {
        number: i + 1,
        time: extremeText(time),
        ...Object.fromEntries(variables.map((name, k) => [`v-${name}`, extremeText(point[k] ?? 0)])),
      },
    })),
  };
}
