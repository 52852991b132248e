import type { ReactNode } from 'react';
import { mathName } from '@/features/notation/math-name';
import type { Trace } from '@/schemas/generated/contract';
import { crossingTable } from './crossing-table';
import { Figure } from './figure';
import { SectionPlot } from './lazy-pictures';
import type { OtherOrbit } from './other-orbits';
import type { PlanePoint } from './plane-point';
import { traceCrossings } from './trace-crossings';

export interface SectionFigureProps {
  trace: Trace;
  /** The two coordinates drawn; those that vary on the section. */
  names: readonly [string, string];
  title?: ReactNode;
  caption?: ReactNode;
  known?: readonly PlanePoint[];
  /** Crossings of up to three other orbits, named. */
  others?: readonly OtherOrbit[];
  /** grad u · f on the section, for the lines of tangency. */
  sign?: ((x: number, y: number) => number) | null;
  fileName: string;
  selected?: number | null;
  onSelect?: (crossing: number) => void;
}

/** The crossings on the section, with their table. */
export function SectionFigure(props: SectionFigureProps) {
  const { trace, names, title, caption, known, others, sign, fileName, selected = null, onSelect } = props;
  const crossings = traceCrossings(trace);
  const [a, b] = [trace.variables.indexOf(names[0]), trace.variables.indexOf(names[1])];
  const points = crossings.map(({ point }): PlanePoint => [point[a] ?? 0, point[b] ?? 0]);
  return (
    <Figure
      title={title ?? 'On the section'}
      name="On the section"
      caption={caption ?? 'The crossings, numbered in order of time.'}
      table={crossingTable(trace.variables, crossings)}
      data={{ variables: trace.variables, crossings, ...(others && { others }) }}
      fileName={fileName}
      selected={selected}
      {...(onSelect && { onSelect })}
    >
      {(size) => (
        <SectionPlot
          names={[mathName(names[0]), mathName(names[1])]}
          crossings={points}
          {...{ selected, ...size }}
          {...(known && { known })}
          {...(others && { others })}
          {...(sign && { sign })}
          {...(onSelect && { onSelect })}
        />
      )}
    </Figure>
  );
}
