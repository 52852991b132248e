import { useState } from 'react';
import { View } from 'react-native';
import { useClaimSubmission, useReleaseSubmission } from '@/features/api/submissions';
import { RefusedFields } from '@/features/checking/refused-fields';
import { clockTime } from '@/features/desk/time-words';
import { Button, Sheet, space, Text, TextButton, useLayout } from '@/features/ui';
import type { Submission } from '@/schemas/generated/contract';

/** Who holds a submission, until when, in few words on a phone; claim, release, take over. */
export function ClaimLine({ submission }: { submission: Submission }) {
  const phone = useLayout() === 'phone';
  const claim = useClaimSubmission();
  const release = useReleaseSubmission();
  const [isAsking, setAsking] = useState(false);
  const { id, claim: held } = submission;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.half }}>
      {held ? (
        <Text tone="muted">
          {phone ? (held.byMe ? 'yours' : held.by) : `claimed by ${held.byMe ? 'you' : held.by}`} until{' '}
          {clockTime(held.until)} ·
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
