import { isRefusal } from '@/features/api/api-error';
import { failureWords } from '@/features/api/failure-words';
import { hasRole, useSession } from '@/features/api/session';
import { useSubmission } from '@/features/api/submissions';
import { useSystems } from '@/features/api/systems';
import { DraftEditor } from '@/features/desk/draft-editor';
import { Review } from '@/features/desk/review';
import { Button, Failure, Page, PageSkeleton, Text } from '@/features/ui';

const back = { href: '/desk', label: 'Desk' };

/** One submission: the form for whoever may edit it, the review for everyone else. */
export function SubmissionScreen({ submissionId }: { submissionId: string }) {
  const session = useSession();
  const submission = useSubmission(submissionId);
  const systems = useSystems();
  if (session.isPending || submission.isPending || systems.isPending)
    return <PageSkeleton title="Submission" back={back} />;
  if (isRefusal(submission.error, 'not-signed-in', 'session-expired')) {
    return (
      <Page title="Submission" back={back}>
        <Text>Sign in to see it.</Text>
        <Button filled href={`/sign-in?next=/desk/${encodeURIComponent(submissionId)}`}>
          Sign in
        </Button>
      </Page>
    );
  }
  if (submission.isError || systems.isError) {
    const words = failureWords(submission.error ?? systems.error, 'The submission', 'Nothing was lost.');
    return (
      <Page title="Submission" back={back}>
        <Failure {...words} onRetry={() => Promise.all([submission.refetch(), systems.refetch()])} />
      </Page>
    );
  }
  const { data, etag } = submission.data;
  const isEditable = data.isMine && (data.reviewState === 'draft' || data.reviewState === 'returned');
  if (isEditable) return <DraftEditor key={data.id} submission={data} etag={etag} systems={systems.data} />;
  const user = session.data?.user ?? null;
  return (
    <Review key={data.id} submission={data} etag={etag} systems={systems.data} isCurator={hasRole(user, 'curator')} />
  );
}
