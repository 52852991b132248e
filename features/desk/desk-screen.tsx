import { View } from 'react-native';
import { hasRole, useSession } from '@/features/api/session';
import { useMySubmissions } from '@/features/api/submissions';
import { QueueList } from '@/features/desk/queue-list';
import { queueWords } from '@/features/desk/queue-words';
import { ROOM_FOR_QUEUE } from '@/features/desk/room-for-queue';
import { SubmissionList } from '@/features/desk/submission-list';
import { useNow } from '@/features/desk/use-now';
import { useQueue } from '@/features/desk/use-queue';
import { Button, Page, PageSkeleton, space, Text, useContainerWidth } from '@/features/ui';

const TITLE = 'Desk';

/** What waits for whom: one's own submissions, and for curators the queue. */
export function DeskScreen() {
  const session = useSession();
  if (session.isPending) return <PageSkeleton title={TITLE} />;
  const user = session.data?.user ?? null;
  if (!user) {
    return (
      <Page title={TITLE}>
        <View style={{ gap: space.two, alignItems: 'flex-start' }}>
          <Text>The Desk keeps what you send, from draft to decision. Sign in to see yours.</Text>
          <Button filled href="/sign-in?next=/desk">
            Sign in
          </Button>
        </View>
      </Page>
    );
  }
  return <Lists isCurator={hasRole(user, 'curator')} />;
}

function Lists({ isCurator }: { isCurator: boolean }) {
  const mine = useMySubmissions();
  const hasColumn = useContainerWidth() >= ROOM_FOR_QUEUE;
  const showsQueue = isCurator && !hasColumn;
  return (
    <Page
      title={showsQueue ? 'Queue' : 'Desk'}
      {...(showsQueue && { subtitle: <QueueLine /> })}
      actions={
        <Button href="/bench" filled={!showsQueue}>
          Check an orbit
        </Button>
      }
    >
      <View style={{ gap: space.six }}>
        {showsQueue ? <Queue /> : null}
        <SubmissionList
          title="My submissions"
          list={mine}
          empty="You have sent nothing yet. Check an orbit on the Bench; it becomes a draft here in one step."
        />
      </View>
    </Page>
  );
}

function Queue() {
  return <QueueList queue={useQueue(true)} />;
}

/** How many wait, and since when. */
function QueueLine() {
  const { review, waiting } = useQueue(true);
  const now = useNow();
  return <Text tone="muted">{queueWords(review.data?.pages[0]?.total, waiting[0], now)}</Text>;
}
