import { Fragment } from 'react';
import { View } from 'react-native';
import { Formula } from '@/features/notation/formula';
import { formatCount } from '@/features/notation/format-count';
import { colour, Heading, space, Text } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

type SystemSection = System['sections'][number];

/** The named sections: formula, what they are for, letters, entries. */
export function SystemSections({ system: { sections } }: { system: System }) {
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>{sections.length === 1 ? 'Section' : 'Sections'}</Heading>
      {sections.length === 0 ? <Text>None is named; an orbit brings its own.</Text> : null}
      {sections.map((section) => (
        <OneSection key={section.name} section={section} />
      ))}
    </View>
  );
}

function OneSection({ section }: { section: SystemSection }) {
  const { name, formula, description, letters, entries } = section;
  return (
    <View style={{ borderTopWidth: 1, borderColor: colour.hairline, paddingVertical: space.one, gap: 2 }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline', gap: space.two }}>
        <Text>
          <Text mono weight="semibold">
            {name}
          </Text>
          {'  '}
          <Formula text={formula} /> = 0, crossed upward
        </Text>
        <Text mono size={14} nowrap tone="muted">
          {formatCount(entries)} {entries === 1 ? 'orbit' : 'orbits'}
        </Text>
      </View>
      {description ? (
        <Text size={14} tone="muted">
          {description}
        </Text>
      ) : null}
      {letters.length > 0 ? <Letters letters={letters} /> : null}
    </View>
  );
}

/** "A where −x > 0, B where x > 0" */
function Letters({ letters }: { letters: SystemSection['letters'] }) {
  return (
    <Text size={14}>
      Letters:{' '}
      {letters.map(({ letter, where }, index) => (
        <Fragment key={letter}>
          {index > 0 ? ', ' : null}
          <Text mono>{letter}</Text> where <Formula text={where} /> {'>'} 0
        </Fragment>
      ))}
    </Text>
  );
}
