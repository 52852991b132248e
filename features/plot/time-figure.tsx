import { type ReactNode, useState } from 'react';
import { View } from 'react-native';
import { mathName } from '@/features/notation/math-name';
import { Select, Text } from '@/features/ui';
import type { Trace } from '@/schemas/generated/contract';
import { crossingTable } from './crossing-table';
import { Figure } from './figure';
import type { PlaneLevel } from './plane-level';
import { TimePlot } from './lazy-pictures';
import { traceCrossings } from './trace-crossings';

export interface TimeFigureProps {
  trace: Trace;
  section?: PlaneLevel | null;
  /** Name of the coordinate to begin with; the last unless given. */
  start?: string;
  caption?: ReactNode;
  fileName: string;
  selected?: number | null;
  onSelect?: (crossing: number) => void;
}

/** One coordinate, chosen, against time. */
export function TimeFigure({
  trace,
  section = null,
  start,
  caption,
  fileName,
  selected = null,
  onSelect,
}: TimeFigureProps) {
  const { variables } = trace;
  const [coordinate, setCoordinate] = useState(Math.max(0, start ? variables.indexOf(start) : variables.length - 1));
  const name = mathName(variables[coordinate] ?? '');
  return (
    <Figure
      title={
        <>
          <Text italic>{name}</Text> against time
        </>
      }
      name={`${name} against time`}
      caption={caption ?? 'The crossings in one period.'}
      table={crossingTable(variables, traceCrossings(trace))}
      data={{ variable: variables[coordinate], times: trace.times, values: trace.points.map((p) => p[coordinate]) }}
      fileName={fileName}
      aspect={0.72}
      selected={selected}
      {...(onSelect && { onSelect })}
      controls={
        <View style={{ width: 64 }}>
          <Select
            label="Coordinate"
            hideLabel
            compact
            value={String(coordinate)}
            options={variables.map((variable, i) => ({ value: String(i), label: mathName(variable) }))}
            onChange={(value) => setCoordinate(parseInt(value, 10))}
          />
        </View>
      }
    >
      {(size) => <TimePlot {...{ trace, coordinate, section, selected, ...size }} {...(onSelect && { onSelect })} />}
    </Figure>
  );
}
