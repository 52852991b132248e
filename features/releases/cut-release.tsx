import { useState } from 'react';
import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { isCutting, useCutRelease } from '@/features/api/releases';
import { Button, Failure, Form, space, TextArea, useAnnounce } from '@/features/ui';
import type { Release } from '@/schemas/generated/contract';

const LONGEST_NOTE = 2000;

/** What a curator needs to cut a release: a note for its readers, and the button. */
export function CutRelease({ releases }: { releases: Release[] }) {
  const [note, setNote] = useState('');
  const cut = useCutRelease();
  const announce = useAnnounce();
  const isBusy = cut.isPending || releases.some(isCutting);
  const send = () =>
    cut.mutate(note, {
      onSuccess: ({ id }) => {
        setNote('');
        announce(`Release ${id} is being cut.`);
      },
    });
  return (
    <Form name="Cut a release" onSubmit={send}>
      <View style={{ gap: space.oneHalf, maxWidth: 544 }}>
        <TextArea label="Note, kept with the release" value={note} onChangeText={setNote} maxLength={LONGEST_NOTE} />
        {cut.isError ? (
          <Failure {...failureWords(cut.error, 'The release', 'Nothing was cut; your note is kept.')} />
        ) : null}
        <View style={{ flexDirection: 'row' }}>
          <Button filled submit disabledBecause={isBusy ? 'A release is being cut.' : null}>
            Cut a release
          </Button>
        </View>
      </View>
    </Form>
  );
}
