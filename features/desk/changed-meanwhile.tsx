import { View } from 'react-native';
import { useQueryClient } from '@tanstack/react-query';
import { submissionQueries } from '@/features/api/submissions';
import { CopyButton, space, Text, TextButton } from '@/features/ui';
import type { Submission } from '@/schemas/generated/contract';

/** A decision on what no longer stands: nothing was recorded, the text is kept. */
export function ChangedMeanwhile({ submission, comment }: { submission: Submission; comment: string }) {
  const cache = useQueryClient();
  return (
    <View role="alert" style={{ gap: space.half }}>
      <Text tone="oxide">
        Not recorded. The submission changed while you were deciding on revision {submission.revision}. Your text is
        kept.
      </Text>
      <View style={{ flexDirection: 'row', gap: space.two }}>
        <TextButton
          onPress={() => void cache.invalidateQueries({ queryKey: submissionQueries.one(submission.id).queryKey })}
        >
          See what it is now
        </TextButton>
        {comment ? <CopyButton text={comment} what="my text" /> : null}
      </View>
    </View>
  );
}
