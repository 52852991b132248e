import { View } from 'react-native';
import { failureWords } from '@/features/api/failure-words';
import { QueueItem } from '@/features/desk/queue-item';
import { useNow } from '@/features/desk/use-now';
import type { useQueue } from '@/features/desk/use-queue';
import { Button, Empty, Failure, space, StaffLines, Text } from '@/features/ui';

interface QueueListProps {
  queue: ReturnType<typeof useQueue>;
  /** Id of the submission that is open beside it. */
  open?: string | null;
  /** It stands in the column beside what is open. */
  narrow?: boolean;
}

/** The queue, by whose turn it is. */
export function QueueList({ queue, open = null, narrow = false }: QueueListProps) {
  const now = useNow();
  const { review, returned, groups } = queue;
  if (review.isPending) return <StaffLines kind="loading" />;
  if (review.isError)
    return <Failure {...failureWords(review.error, 'The queue', 'Nothing was lost.')} onRetry={review.refetch} />;
  if (groups.length === 0) return <Empty>Nothing waits for a curator.</Empty>;
  return (
    <View style={{ gap: space.three }}>
      {groups.map(({ title, items }) => (
        <View key={title}>
          <Text smallCaps size={14} tone="muted">
            {title}{' '}
            <Text mono smallCaps={false}>
              {items.length}
            </Text>
          </Text>
          <div role="list" aria-label={title}>
            {items.map((item) => (
              <QueueItem key={item.id} submission={item} isOpen={item.id === open} now={now} narrow={narrow} />
            ))}
          </div>
        </View>
      ))}
      {[review, returned].map((list, index) =>
        list.hasNextPage ? (
          <Button key={index} onPress={() => void list.fetchNextPage()}>
            {index === 0 ? 'Show more that wait' : 'Show more that were returned'}
          </Button>
        ) : null,
      )}
    </View>
  );
}
