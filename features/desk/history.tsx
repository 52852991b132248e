import { View } from 'react-native';
import { reasonWords } from '@/features/desk/reason-words';
import { longDate } from '@/features/notation/long-date';
import { Heading, Text } from '@/features/ui';
import type { Submission, SubmissionEvent } from '@/schemas/generated/contract';

const eventWords = ({ kind, from, to, reason }: SubmissionEvent): string => {
  const change = from !== to && to !== null ? `, now ${to.replace(/-/g, ' ')}` : '';
  return `${kind.replace(/-/g, ' ')}${change}${reason ? `: ${reasonWords[reason]}` : ''}`;
};

/** Every change of a submission, the newest last. */
export function History({ submission }: { submission: Submission }) {
  return (
    <View>
      <Heading level={2}>History</Heading>
      <View role="list" aria-label="History">
        {submission.events.map((event) => (
          <Text key={event.id} role="listitem" size={14}>
            <Text tone="muted">{longDate(event.at)}</Text> {event.who ?? 'The machine'} · revision {event.revision} ·{' '}
            {eventWords(event)}
            {event.comment ? ` · “${event.comment}”` : ''}
          </Text>
        ))}
      </View>
    </View>
  );
}
