import { type ReactNode, useState } from 'react';
import { View } from 'react-native';
import { mathName } from '@/features/notation/math-name';
import { Select, space, Text } from '@/features/ui';
import type { Trace } from '@/schemas/generated/contract';
import { crossingTable } from './crossing-table';
import { Figure } from './figure';
import { OrbitPlot } from './lazy-pictures';
import type { PlaneLevel } from './plane-level';
import { traceCrossings } from './trace-crossings';
import { TurnByDrag } from './turn-by-drag';
import { TurnControl } from './turn-control';
import { type Turn, unturned } from './turn';

export interface ProjectionFigureProps {
  trace: Trace;
  section?: PlaneLevel | null;
  /** Names of the coordinates to begin with; first and last unless given. */
  start?: readonly [string, string];
  caption?: ReactNode;
  fileName: string;
  selected?: number | null;
  onSelect?: (crossing: number) => void;
}

interface AxisSelectsProps {
  variables: readonly string[];
  axes: readonly [number, number];
  onAxes: (axes: readonly [number, number]) => void;
}

function AxisSelects({ variables, axes, onAxes }: AxisSelectsProps) {
  const options = variables.map((name, i) => ({ value: String(i), label: mathName(name) }));
  const chosen = (text: string) => parseInt(text, 10);
  return (
    <View style={{ flexDirection: 'row', gap: space.one, width: 136 }}>
      <Select
        label="Across"
        hideLabel
        compact
        options={options}
        value={String(axes[0])}
        onChange={(v) => onAxes([chosen(v), axes[1]])}
      />
      <Select
        label="Upward"
        hideLabel
        compact
        options={options}
        value={String(axes[1])}
        onChange={(v) => onAxes([axes[0], chosen(v)])}
      />
    </View>
  );
}

/** The coordinate that a turn brings in: the first that is not drawn. */
function depthOf(count: number, axes: readonly [number, number]): number | null {
  const rest = Array.from({ length: count }, (_, i) => i).filter((i) => !axes.includes(i));
  return rest[0] ?? null;
}

/** The orbit projected on two coordinates that one chooses; with a third it can be turned. */
export function ProjectionFigure(props: ProjectionFigureProps) {
  const { trace, section = null, start, caption, fileName, selected = null, onSelect } = props;
  const { variables } = trace;
  const indexOf = (name: string | undefined, fallback: number) =>
    Math.max(0, name ? variables.indexOf(name) : fallback);
  const [axes, setAxes] = useState<readonly [number, number]>([
    indexOf(start?.[0], 0),
    indexOf(start?.[1], variables.length - 1),
  ]);
  const [turn, setTurn] = useState<Turn>(unturned);
  const depth = depthOf(variables.length, axes);
  const [across, upward] = [mathName(variables[axes[0]] ?? ''), mathName(variables[axes[1]] ?? '')];
  return (
    <Figure
      title={
        <>
          Projection on <Text italic>{across}</Text>, <Text italic>{upward}</Text>
        </>
      }
      name={`Projection on ${across}, ${upward}`}
      caption={caption ?? 'One period; notes are crossings, numbered in order of time.'}
      table={crossingTable(variables, traceCrossings(trace))}
      data={trace}
      fileName={fileName}
      selected={selected}
      {...(onSelect && { onSelect })}
      controls={variables.length > 2 ? <AxisSelects variables={variables} axes={axes} onAxes={setAxes} /> : null}
      after={depth === null ? null : <TurnControl turn={turn} onTurn={setTurn} />}
    >
      {(size) => (
        <TurnByDrag turn={turn} onTurn={depth === null ? () => undefined : setTurn}>
          <OrbitPlot {...{ trace, axes, depth, turn, section, selected, ...size }} {...(onSelect && { onSelect })} />
        </TurnByDrag>
      )}
    </Figure>
  );
}
