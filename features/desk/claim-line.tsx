import { useState } from 'react';
import { View } from 'react-native';
import { useClaimSubmission, useReleaseSubmission } from '@/features/api/submissions';
import { RefusedFields } from '@/features/checking/refused-fields';
import { Button, Sheet, space, Text, TextButton } from '@/features/ui';
import type { Submission } from '@/schemas/generated/contract';

const clock = (at: string): string => new Date(at).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });

/** Who holds a submission, until when; claim, release, take over. */
export function ClaimLine({ submission }: { submission: Submission }) {
  const claim = useClaimSubmission();
  const release = useReleaseSubmission();
  const [isAsking, setAsking] = useState(false);
  const { id } = submission;
  const held = submission.claim;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.one }}>
      {held ? (
        <Text size={14} tone="muted">
          claimed by {held.byMe ? 'you' : held.by} until {clock(held.until)}
        </Text>
      ) : null}
      {held === null ? (
        <Button keys="c" onPress={() => claim.mutate({ id })}>
          Claim
        </Button>
      ) : held.byMe ? (
        <TextButton onPress={() => release.mutate({ id })}>Release</TextButton>
      ) : (
        <TextButton onPress={() => setAsking(true)}>Take over</TextButton>
      )}
      <RefusedFields error={claim.error ?? release.error} what="The claim" />
      <Sheet
        open={isAsking}
        onClose={() => setAsking(false)}
        title="Take this submission over?"
        footer={
          <>
            <Button filled onPress={() => claim.mutate({ id, takeOver: true }, { onSettled: () => setAsking(false) })}>
              Take it over
            </Button>
            <Button onPress={() => setAsking(false)}>Leave it</Button>
          </>
        }
      >
        <Text>{held?.by ?? 'Another curator'} is working on it. Taking it over is written into its history.</Text>
      </Sheet>
    </View>
  );
}
