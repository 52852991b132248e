import { View } from 'react-native';
import { useRecheckSubmission } from '@/features/api/submissions';
import { RefusedFields } from '@/features/checking/refused-fields';
import { Button, space, Text } from '@/features/ui';
import type { Submission } from '@/schemas/generated/contract';

/** A report of an older engine, or a check that broke: one button checks again. */
export function StaleLine({ submission }: { submission: Submission }) {
  const recheck = useRecheckSubmission();
  const { checkState, report, reportIsCurrent, failure } = submission;
  const isStale = checkState === 'stale' || checkState === 'failed' || (report !== null && !reportIsCurrent);
  if (!isStale) return null;
  return (
    <View style={{ gap: space.one, alignItems: 'flex-start' }}>
      <Text tone="ochre">{failure ? failure.message : 'Checked by an older engine.'}</Text>
      <RefusedFields error={recheck.error} what="Checking again" />
      <Button onPress={() => recheck.mutate({ id: submission.id })}>Check again</Button>
    </View>
  );
}
