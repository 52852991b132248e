import { Formula } from '@/features/notation/formula';
import { ParameterList } from '@/features/notation/parameter-list';
import { shownParameters } from '@/features/notation/shown-parameters';
import { LinkText, Text } from '@/features/ui';
import type { Entry, System } from '@/schemas/generated/contract';

/** System, parameters, section, in one line of text. */
export function SystemLine({ entry, system }: { entry: Entry; system: System | undefined }) {
  const values = shownParameters(entry.parameters, system);
  return (
    <Text tone="muted">
      <LinkText href={`/systems/${entry.system.slug}`}>
        <Text italic>{entry.system.name}</Text>
      </LinkText>
      {Object.keys(values).length > 0 ? ', ' : null}
      <ParameterList values={values} equals /> · section <Formula text={entry.section.formula} />
    </Text>
  );
}
