import { useMemo } from 'react';
import { View } from 'react-native';
import type { UseQueryResult } from '@tanstack/react-query';
import { failureWords } from '@/features/api/failure-words';
import { countWord } from '@/features/notation/count-word';
import { sectionStaff } from '@/features/notation/entry-music';
import { mathName } from '@/features/notation/math-name';
import { MultipliersFigure } from '@/features/plot/multipliers-figure';
import { type PlaneLevel, planeLevel } from '@/features/plot/plane-level';
import { ProjectionFigure } from '@/features/plot/projection-figure';
import { sectionAxes } from '@/features/plot/section-axes';
import { sectionField } from '@/features/plot/section-field';
import { SectionFigure } from '@/features/plot/section-figure';
import { TimeFigure } from '@/features/plot/time-figure';
import { space, StaffLines, Text, TextButton, useLayout } from '@/features/ui';
import type { Entry, System, Trace } from '@/schemas/generated/contract';

interface OrbitFiguresProps {
  entry: Entry;
  system: System | undefined;
  trace: UseQueryResult<Trace>;
  selected: number | null;
  onSelect: (crossing: number) => void;
}

/** Projection, section, coordinate against time, multipliers. */
export function OrbitFigures({ entry, system, trace, selected, onSelect }: OrbitFiguresProps) {
  const phone = useLayout() === 'phone';
  const fileName = (what: string) => `${entry.accession}-${what}`;
  return (
    <div style={phone ? ONE : TWO}>
      {trace.data ? (
        <TracedFigures {...{ entry, system, trace: trace.data, selected, onSelect, fileName }} />
      ) : (
        <NoTrace trace={trace} />
      )}
      <MultipliersFigure multipliers={entry.multipliers} fileName={fileName('multipliers')} />
    </div>
  );
}

const ONE = { display: 'grid', gridTemplateColumns: 'minmax(0, 1fr)', gap: space.four } as const;
const TWO = {
  ...ONE,
  gridTemplateColumns: 'repeat(2, minmax(0, 1fr))',
  gap: '32px 40px',
  alignItems: 'start',
} as const;

function NoTrace({ trace }: { trace: UseQueryResult<Trace> }) {
  if (!trace.isError) return <StaffLines kind="loading" />;
  const { sentence } = failureWords(trace.error, 'The curve', 'The numbers beside it are complete.');
  return (
    <View style={{ gap: space.one }}>
      <StaffLines kind="stopping" />
      <Text>{sentence}</Text>
      <TextButton onPress={() => void trace.refetch()}>Draw the curve again</TextButton>
    </View>
  );
}

type TracedProps = Omit<OrbitFiguresProps, 'trace'> & { trace: Trace; fileName: (what: string) => string };

function TracedFigures({ entry, system, trace, selected, onSelect, fileName }: TracedProps) {
  const section = planeLevel(entry.section.formula, trace.variables);
  const shared = { trace, selected, onSelect };
  const field = useMemo(() => (system ? sectionField(system, entry.section, entry.parameters) : null), [system, entry]);
  const isOne = entry.crossings.length === 1;
  const count = countWord(entry.crossings.length);
  const noun = isOne ? 'crossing' : 'crossings';
  return (
    <>
      <ProjectionFigure
        {...shared}
        section={section}
        start={projectionAxes(trace, section, sectionStaff(system, entry.section.name).coordinate)}
        caption={
          isOne
            ? 'One period; the note is the one crossing.'
            : `One period; the notes are the ${count} crossings, numbered in order of time.`
        }
        fileName={fileName('projection')}
      />
      <SectionFigure
        {...shared}
        names={sectionAxes(trace.variables, section)}
        {...(field && { sign: field.sign })}
        title={<SectionTitle section={section} />}
        caption={
          (isOne
            ? 'The one crossing; there the flow rises through the section.'
            : `The ${count} crossings, numbered in order of time; at each the flow rises through the section.`) +
          (field ? ' Dashed, where it comes near: the line of tangency.' : '')
        }
        fileName={fileName('section')}
      />
      <TimeFigure
        {...shared}
        section={section}
        {...(section && { start: section.variable })}
        caption={`${count.charAt(0).toUpperCase()}${count.slice(1)} upward ${noun} in one period.`}
        fileName={fileName('time')}
      />
    </>
  );
}

function SectionTitle({ section }: { section: PlaneLevel | null }) {
  if (!section) return <>On the section</>;
  return (
    <>
      On the section <Text italic>{mathName(section.variable)}</Text> = {String(section.level).replace('-', '−')}
    </>
  );
}

/** The incipit's coordinate against the one that the section fixes; else the first against the last. */
function projectionAxes({ variables }: Trace, section: PlaneLevel | null, drawn: string): [string, string] {
  const [first = '', last = ''] = [variables[0], variables.at(-1)];
  if (!section || section.variable === drawn || !variables.includes(drawn)) return [first, last];
  const [a, b] = [variables.indexOf(drawn), variables.indexOf(section.variable)];
  return a < b ? [drawn, section.variable] : [section.variable, drawn];
}
