import { View } from 'react-native';
import { hasRole, useSession } from '@/features/api/session';
import { useMySubmissions, useReviewQueue } from '@/features/api/submissions';
import { SubmissionList } from '@/features/desk/submission-list';
import { Button, Page, PageSkeleton, space, Text, useLayout } from '@/features/ui';

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
  const wide = useLayout() === 'wide';
  const mine = useMySubmissions();
  const queue = useReviewQueue(isCurator);
  const half = { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 } as const;
  return (
    <Page
      title={TITLE}
      actions={
        <Button href="/bench" filled>
          Check an orbit
        </Button>
      }
    >
      <View style={{ flexDirection: wide ? 'row' : 'column', gap: space.six }}>
        {isCurator ? (
          <View style={wide ? half : null}>
            <SubmissionList title="Queue" list={queue} empty="Nothing waits for a curator." />
          </View>
        ) : null}
        <View style={wide ? half : null}>
          <SubmissionList
            title="My submissions"
            list={mine}
            empty="You have sent nothing yet. Check an orbit on the Bench; it becomes a draft here in one step."
          />
        </View>
      </View>
    </Page>
  );
}
