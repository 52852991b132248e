import { Fragment, type ReactNode } from 'react';
import { View } from 'react-native';
import { Formula } from '@/features/notation/formula';
import { formatCount } from '@/features/notation/format-count';
import { longDate } from '@/features/notation/long-date';
import { ParameterList } from '@/features/notation/parameter-list';
import { DefinitionRows, Text } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** Parameters, symmetries, invariants, sections, letters, entries, version. */
export function SystemFacts({ system }: { system: System }) {
  const { document, divergence, entries, version, acceptedAt } = system;
  const parameters = Object.fromEntries(document.parameters.map(({ name, value }) => [name, String(value)]));
  const invariants = document.invariants ?? [];
  const angles = document.variables.filter(({ modulus }) => modulus !== undefined);
  const rows: { name: string; value: ReactNode }[] = [
    { name: 'Parameters', value: <Parameters values={parameters} described={document.parameters} /> },
    ...(divergence === null ? [] : [{ name: 'Divergence', value: <Formula text={divergence} /> }]),
    { name: 'Symmetries', value: <Symmetries system={system} /> },
    {
      name: 'Invariants',
      value:
        invariants.length === 0
          ? 'none'
          : lines(invariants.map(({ name, formula }) => [name, <Named key={name} name={name} formula={formula} />])),
    },
    ...(angles.length === 0
      ? []
      : [
          {
            name: 'Angles',
            value: lines(angles.map((a) => [a.name, <Angle key={a.name} name={a.name} modulus={a.modulus!} />])),
          },
        ]),
    { name: 'Orbits', value: entries === 0 ? 'none yet' : formatCount(entries) },
    { name: 'Version', value: `${version}, accepted ${longDate(acceptedAt)}` },
  ];
  return <DefinitionRows ruled rows={rows} />;
}

const lines = (items: [string, ReactNode][]): ReactNode => (
  <View>
    {items.map(([key, item]) => (
      <Text key={key}>{item}</Text>
    ))}
  </View>
);

interface ParametersProps {
  values: Record<string, string>;
  described: System['document']['parameters'];
}

function Parameters({ values, described }: ParametersProps) {
  if (described.length === 0) return <Text>none</Text>;
  return (
    <View>
      <Text>
        <ParameterList values={values} equals />
      </Text>
      {described.map(({ name, description }) =>
        description ? <Described key={name} name={name} text={description} /> : null,
      )}
    </View>
  );
}

function Described({ name, text }: { name: string; text: string }) {
  return (
    <Text size={14} tone="muted">
      <Formula text={name} />: {text}
    </Text>
  );
}

function Named({ name, formula }: { name: string; formula: string }) {
  return (
    <>
      {name}: <Formula text={formula} />
    </>
  );
}

function Angle({ name, modulus }: { name: string; modulus: string }) {
  return (
    <>
      <Formula text={name} /> modulo <Formula text={modulus} />
    </>
  );
}

/** "half-turn: (x, y, z) to (−x, −y, z)" */
function Symmetries({ system: { document } }: { system: System }) {
  const symmetries = document.symmetries ?? [];
  const names = document.variables.map(({ name }) => name);
  if (symmetries.length === 0) return <Text>none</Text>;
  return (
    <View>
      {symmetries.map(({ name, map, reversesTime }) => (
        <Text key={name}>
          {name}: (<Tuple formulas={names} />) to (<Tuple formulas={names.map((one) => map[one] ?? one)} />)
          {reversesTime ? ', with time reversed' : ''}
        </Text>
      ))}
    </View>
  );
}

function Tuple({ formulas }: { formulas: readonly string[] }) {
  return (
    <>
      {formulas.map((formula, index) => (
        <Fragment key={index}>
          {index > 0 ? ', ' : null}
          <Formula text={formula} />
        </Fragment>
      ))}
    </>
  );
}
