import { useState } from 'react';
import { View } from 'react-native';
import { useCommentSubmission } from '@/features/api/submissions';
import { RefusedFields } from '@/features/checking/refused-fields';
import { longDate } from '@/features/notation/long-date';
import { Button, Form, Heading, space, Text, TextArea } from '@/features/ui';
import type { Submission } from '@/schemas/generated/contract';

/** What contributor and curators say to each other. */
export function Discussion({ submission }: { submission: Submission }) {
  const comment = useCommentSubmission();
  const [text, setText] = useState('');
  const onSubmit = () => comment.mutate({ id: submission.id, text }, { onSuccess: () => setText('') });
  return (
    <View style={{ gap: space.one }}>
      <Heading level={2}>Discussion</Heading>
      <View role="list" aria-label="Comments">
        {submission.comments.map((one) => (
          <View key={one.id} role="listitem">
            <Text size={14} tone="muted">
              {one.who}, {longDate(one.at)}, on revision {one.revision}
            </Text>
            <Text>{one.text}</Text>
          </View>
        ))}
      </View>
      <Form name="Comment" onSubmit={onSubmit}>
        <View style={{ gap: space.one, alignItems: 'flex-start' }}>
          <TextArea label="Comment" rows={2} value={text} onChangeText={setText} />
          <RefusedFields error={comment.error} what="The comment" />
          <Button submit disabledBecause={text.trim() === '' ? 'Nothing is written yet.' : null}>
            Say it
          </Button>
        </View>
      </Form>
    </View>
  );
}
