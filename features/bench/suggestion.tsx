import { View } from 'react-native';
import { draftOfBody, type OrbitDraft } from '@/features/checking/orbit-draft';
import { Button, space, Text } from '@/features/ui';
import type { CheckReport } from '@/schemas/generated/contract';

interface Props {
  report: CheckReport;
  draft: OrbitDraft;
  onFollow: (draft: OrbitDraft) => void;
}

const names: Readonly<Record<string, string>> = {
  period: 'T',
  section: 'the section',
  point: 'the corrected point',
  returns: 'the returns',
};

/** A change to one field that the engine has tried; one press makes it and checks again. */
export function Suggestion({ report, draft, onFollow }: Props) {
  const { suggestion } = report;
  if (!suggestion) return null;
  const { field, value, verdict } = suggestion;
  const shown = Array.isArray(value) ? value.join(', ') : String(value);
  // A suggestion has the member's form in a body, so the form reads it as it reads any body.
  const member = field as keyof OrbitDraft;
  const next = { ...draft, [member]: draftOfBody({ [field]: value })[member] };
  return (
    <View style={{ gap: space.one }}>
      <Text>
        <Text weight="semibold">One change was tried.</Text> With {names[field] ?? field} = <Text mono>{shown}</Text> it{' '}
        {verdict.replace(/-/g, ' ')}.
      </Text>
      <View style={{ flexDirection: 'row' }}>
        <Button onPress={() => onFollow(next)}>
          Use {names[field] ?? field} = {shown}
        </Button>
      </View>
    </View>
  );
}
