import { useRouter } from 'expo-router';
import { useRef } from 'react';
import { View } from 'react-native';
import { newIdempotencyKey } from '@/features/api/client';
import { useUser } from '@/features/api/session';
import { useCreateSubmission } from '@/features/api/submissions';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { RefusedFields } from '@/features/checking/refused-fields';
import { Button, space, Text } from '@/features/ui';
import type { CheckReport, DraftBody } from '@/schemas/generated/contract';

interface Props {
  report: CheckReport;
  body: DraftBody;
}

/** From a report to the Desk: as a draft, or sent at once. */
export function NextStep({ report, body }: Props) {
  const user = useUser();
  const router = useRouter();
  const create = useCreateSubmission();
  const keys = useRef({ draft: newIdempotencyKey(), send: newIdempotencyKey() });
  const closes = closedOrbit(report) !== null;
  if (!user) {
    return (
      <View style={{ flexDirection: 'row' }}>
        <Button href="/sign-in?next=/bench">Sign in to send</Button>
      </View>
    );
  }
  const onCreate = (send: boolean) =>
    create.mutate(
      { body, send, key: send ? keys.current.send : keys.current.draft },
      { onSuccess: ({ data }) => router.push(`/desk/${data.id}`) },
    );
  const busy = create.isPending ? 'Sending…' : null;
  return (
    <View style={{ gap: space.one }}>
      <Text>
        {closes
          ? 'Sent orbits are released under CC-BY-4.0; a curator decides.'
          : 'A draft can be kept on the Desk, even of an orbit that does not close yet.'}
      </Text>
      <RefusedFields error={create.error} what="Sending" />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>
        {closes ? (
          <Button onPress={() => onCreate(true)} disabledBecause={busy}>
            Send to the curators
          </Button>
        ) : null}
        <Button onPress={() => onCreate(false)} disabledBecause={busy}>
          Send to the Desk as a draft
        </Button>
      </View>
    </View>
  );
}
