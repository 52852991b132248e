import { Formula } from '@/features/notation/formula';
import { ParameterList } from '@/features/notation/parameter-list';
import { LinkText, Text } from '@/features/ui';
import type { Entry, System } from '@/schemas/generated/contract';

/** With so many or fewer, every parameter is named; else those that differ from the system's own. */
const FEW = 3;

/** System, parameters, section, in one line of text. */
export function SystemLine({ entry, system }: { entry: Entry; system: System | undefined }) {
  const values = shownParameters(entry, system);
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

function shownParameters({ parameters }: Entry, system: System | undefined): Record<string, string> {
  const names = Object.keys(parameters);
  if (names.length <= FEW || !system) return parameters;
  const own = new Map(system.document.parameters.map(({ name, value }) => [name, String(value)]));
  return Object.fromEntries(Object.entries(parameters).filter(([name, value]) => own.get(name) !== value));
}
