import { router } from 'expo-router';
import { useMemo } from 'react';
import { useAllCrossings } from '@/features/api/orbits';
import { entryHref } from '@/features/api/page-addresses';
import { formatCount } from '@/features/notation/format-count';
import { Formula } from '@/features/notation/formula';
import { mathName } from '@/features/notation/math-name';
import { extremeText } from '@/features/plot/extreme-text';
import { Figure } from '@/features/plot/figure';
import { SectionSheet } from '@/features/plot/lazy-pictures';
import { knownCrossings, regionLetters, type SectionField } from '@/features/plot/section-field';
import { Text } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

interface SectionSheetFigureProps {
  system: System;
  section: System['sections'][number];
  field: SectionField;
}

/** Rows of the table that stands for the picture. */
const MOST_ROWS = 500;
/** The crossing at which a sheet can be drawn at all: fewer have no extent. */
const FEWEST = 2;

/** The section as a map: where the flow rises through it, the tangency, and the known crossings. */
export function SectionSheetFigure({ system, section, field }: SectionSheetFigureProps) {
  const found = useAllCrossings(system);
  const crossings = useMemo(
    () => knownCrossings(found.data?.items ?? [], system, section, field.names),
    [found.data, system, section, field.names],
  );
  const points = useMemo(() => crossings.map(({ point }) => point), [crossings]);
  const letters = useMemo(() => regionLetters(crossings), [crossings]);
  if (points.length < FEWEST) return null;
  const names: [string, string] = [mathName(field.names[0]), mathName(field.names[1])];
  const isAll = found.data?.next === null;
  return (
    <Figure
      level={2}
      title={
        <>
          Section sheet: <Formula text={section.formula} />
        </>
      }
      name={`Section sheet: ${section.formula}`}
      caption={
        <>
          Plus: the flow rises through the section and a crossing counts; dash: it falls. Marks grow with the speed.
          Dark: {isAll ? 'all' : 'the first'} {formatCount(points.length)} known crossings. Dashed line: tangency.
        </>
      }
      table={{
        columns: [
          { key: 'accession', head: 'Entry', mono: true },
          ...names.map((name, index) => ({ key: String(index), head: <Text italic>{name}</Text>, mono: true })),
        ],
        rows: crossings.slice(0, MOST_ROWS).map(({ accession, point }, index) => ({
          key: String(index),
          cells: { accession, 0: extremeText(point[0]), 1: extremeText(point[1]) },
        })),
      }}
      data={{ names: field.names, crossings: crossings.map(({ accession, point }) => ({ accession, point })) }}
      fileName={`${system.slug}-${section.name}`}
      aspect={1.05}
    >
      {(size) => (
        <SectionSheet
          names={names}
          sign={field.sign}
          crossings={points}
          letters={letters}
          onPress={(index) => {
            const pressed = crossings[index];
            if (pressed) router.push(entryHref(pressed.accession));
          }}
          {...size}
        />
      )}
    </Figure>
  );
}
