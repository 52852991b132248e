import { View } from 'react-native';
import type { OrbitDraft } from '@/features/checking/orbit-draft';
import { mathName } from '@/features/notation/math-name';
import { Field, Select, space } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

/** Chooses a section by its formula. */
const OTHER = ' ';

interface Props {
  system: System;
  draft: OrbitDraft;
  set: (change: Partial<OrbitDraft>) => void;
  errorAt: (pointer: string) => string | null;
}

/** Parameters, defaults shown where nothing is typed, and the section. */
export function SectionFields({ system, draft, set, errorAt }: Props) {
  const named = system.sections.some(({ name }) => name === draft.section);
  const options = [
    ...system.sections.map(({ name, formula }) => ({ value: name, label: `${formula}, crossed upward` })),
    { value: OTHER, label: 'another section, by its formula' },
  ];
  const errorOfSection = errorAt('/section') ?? errorAt('/section/formula') ?? errorAt('/section/plane');
  return (
    <View style={{ gap: space.two }}>
      {system.document.parameters.length > 0 ? (
        <View role="group" aria-label="Parameters" style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>
          {system.document.parameters.map(({ name, value }) => (
            <View key={name} style={{ flexGrow: 1, flexBasis: '22%', minWidth: 80 }}>
              <Field
                label={mathName(name)}
                mono
                value={draft.parameters[name] ?? String(value)}
                onChangeText={(text) => set({ parameters: { ...draft.parameters, [name]: text } })}
                error={errorAt(`/parameters/${name}`)}
              />
            </View>
          ))}
        </View>
      ) : null}
      <Select
        label="Section"
        value={named ? draft.section : OTHER}
        onChange={(section) => set({ section: section === OTHER ? '' : section })}
        options={options}
        error={named ? errorOfSection : null}
      />
      {named ? null : (
        <Field
          label="Formula of the section"
          mono
          value={draft.section}
          onChangeText={(section) => set({ section })}
          hint="A crossing counts where it increases through zero."
          error={errorOfSection}
        />
      )}
    </View>
  );
}
