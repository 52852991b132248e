import { View } from 'react-native';
import { useUser } from '@/features/api/session';
import { formSlips } from '@/features/checking/form-slips';
import { draftOfSystem, type OrbitDraft } from '@/features/checking/orbit-draft';
import { SectionFields } from '@/features/checking/section-fields';
import { SystemField } from '@/features/checking/system-field';
import { mathName } from '@/features/notation/math-name';
import { Field, type FieldProps, space, TextArea, useLayout } from '@/features/ui';
import type { System } from '@/schemas/generated/contract';

export interface OrbitFieldsProps {
  systems: readonly System[];
  draft: OrbitDraft;
  onChange: (draft: OrbitDraft) => void;
  /** What the server says of one member of the body; null where it says nothing. */
  messageAt: (pointer: string) => string | null;
}

/** Coordinates of at most this many characters stand three abreast. */
const SHORT_NUMBER = 10;

const countDigits = (number: string): number =>
  number
    .replace(/e.*$/i, '')
    .replace(/[^0-9]/g, '')
    .replace(/^0+/, '').length;

/** The form of one orbit. */
export function OrbitFields({ systems, draft, onChange, messageAt }: OrbitFieldsProps) {
  const system = systems.find(({ slug }) => slug === draft.system);
  const slips = formSlips(draft);
  const errorAt = (pointer: string): string | null => slips[pointer] ?? messageAt(pointer);
  const set = (change: Partial<OrbitDraft>) => onChange({ ...draft, ...change });
  const digits = countDigits(draft.period);
  const field = (member: 'period' | 'returns' | 'returnTimes' | 'itinerary' | 'tolerance' | 'digits') => ({
    mono: true,
    value: draft[member],
    onChangeText: (text: string) => set({ [member]: text }),
    error: errorAt(`/${member}`),
  });
  return (
    <View style={{ gap: space.two }}>
      <SystemField
        systems={systems}
        value={draft.system}
        onChange={(chosen) => onChange(draftOfSystem(chosen))}
        error={errorAt('/system')}
      />
      {system ? <SectionFields {...{ system, draft, set, errorAt }} /> : null}
      {system ? <PointFields {...{ system, draft, set, errorAt }} /> : null}
      <View style={{ flexDirection: 'row', gap: space.one }}>
        <View style={{ flexGrow: 2, flexBasis: 0 }}>
          <Field
            label="Period T"
            decimal
            {...field('period')}
            hint={digits > 0 ? `${digits} ${digits === 1 ? 'digit' : 'digits'}` : null}
          />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 0 }}>
          <Field label="Returns" {...field('returns')} placeholder="optional" />
        </View>
      </View>
      <Field label="Return times" optional {...field('returnTimes')} placeholder="separated by spaces" />
      <View style={{ flexDirection: 'row', gap: space.one }}>
        <View style={{ flexGrow: 1, flexBasis: 0 }}>
          <Field label="Itinerary" optional {...field('itinerary')} placeholder="e.g. AAB" />
        </View>
        <View style={{ flexGrow: 1, flexBasis: 0 }}>
          <Field label="Tolerance" optional {...field('tolerance')} placeholder="1e-9" />
        </View>
      </View>
      <DigitsField {...field('digits')} />
      <TextArea
        label="Note"
        optional
        rows={2}
        value={draft.note}
        onChangeText={(note) => set({ note })}
        error={errorAt('/note')}
      />
    </View>
  );
}

/** Digits beyond those of doubles: for people with an account, and where they were asked for already. */
function DigitsField(props: Omit<FieldProps, 'label'>) {
  const user = useUser();
  if (!user && props.value === '') return null;
  return (
    <Field
      label="Digits wanted"
      optional
      {...props}
      placeholder="15 to 100"
      hint="More than 17 are computed with long numbers; it takes longer."
    />
  );
}

interface PartProps {
  system: System;
  draft: OrbitDraft;
  set: (change: Partial<OrbitDraft>) => void;
  errorAt: (pointer: string) => string | null;
}

/** One field a coordinate: three abreast where the numbers are short. */
function PointFields({ system, draft, set, errorAt }: PartProps) {
  const phone = useLayout() === 'phone';
  const isShort = draft.point.every((text) => text.length <= SHORT_NUMBER);
  const { variables } = system.document;
  const width = isShort ? '30%' : '100%';
  return (
    <View
      role="group"
      aria-label="Point on the section"
      style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}
    >
      {variables.map(({ name }, index) => (
        <View key={name} style={{ flexGrow: 1, flexBasis: width, minWidth: phone ? 96 : 80 }}>
          <Field
            label={mathName(name)}
            mono
            decimal
            value={draft.point[index] ?? ''}
            onChangeText={(text) =>
              set({ point: variables.map((_, i) => (i === index ? text : (draft.point[i] ?? ''))) })
            }
            error={errorAt(`/point/${index}`) ?? (index === 0 ? errorAt('/point') : null)}
          />
        </View>
      ))}
    </View>
  );
}
