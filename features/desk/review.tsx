import { View } from 'react-native';
import { useRecheckSubmission } from '@/features/api/submissions';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { RefusedFields } from '@/features/checking/refused-fields';
import { ReportView } from '@/features/checking/report-view';
import { ClaimLine } from '@/features/desk/claim-line';
import { DecisionForm } from '@/features/desk/decision-form';
import { NearestEntries } from '@/features/desk/nearest-entries';
import { decisionWords } from '@/features/desk/reason-words';
import { ReviewTabs } from '@/features/desk/review-tabs';
import { checkWords } from '@/features/desk/check-words';
import { orbitState } from '@/features/notation/orbit-state';
import { WithdrawButton } from '@/features/desk/withdraw-button';
import { StateWord } from '@/features/notation/state-word';
import { Button, LinkText, Page, space, Text, useLayout } from '@/features/ui';
import type { Submission, System } from '@/schemas/generated/contract';

interface Props {
  submission: Submission;
  etag: string | null;
  systems: readonly System[];
  isCurator: boolean;
}

const DECISION_WIDTH = 264;

/** One submission with its report, beside its nearest entries; curators decide at the right. */
export function Review({ submission, etag, systems, isCurator }: Props) {
  const wide = useLayout() === 'wide';
  const { number, revision, report, check, owner, accession, decision, isMine } = submission;
  const draft = draftOfBody(submission.body);
  const orbit = report && closedOrbit(report);
  const system = systems.find(({ slug }) => slug === draft.system);
  const state = orbitState(submission.reviewState, submission.checkState, submission.verdict);
  const isOpen = submission.reviewState === 'submitted' || submission.reviewState === 'in-review';
  return (
    <Page
      title={`Submission ${number}`}
      state={<StateWord state={state} />}
      subtitle={
        <Text tone="muted">
          revision {revision} · <Text italic>{system?.name ?? draft.system}</Text> · section {draft.section} · sent by{' '}
          {owner.name} · {checkWords(submission)}
        </Text>
      }
      back={{ href: '/desk', label: 'Desk' }}
      actions={isCurator && isOpen && !isMine ? <ClaimLine submission={submission} /> : null}
    >
      <View style={{ flexDirection: wide ? 'row' : 'column', gap: space.six }}>
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: wide ? 0 : 'auto', minWidth: 0, gap: space.three }}>
          {accession ? (
            <Text>
              In the catalogue as <LinkText href={`/orbits/${accession}`}>{accession}</LinkText>.
            </Text>
          ) : null}
          {decision ? (
            <Text>
              <Text weight="semibold">{decisionWords(decision)}</Text> {decision.comment ?? ''}
            </Text>
          ) : null}
          {report ? (
            <ReportView
              {...{ report, check, system, state }}
              section={draft.section}
              period={draft.period}
              muted={!submission.reportIsCurrent}
            >
              {orbit ? (
                <NearestEntries submission={submission} orbit={orbit} system={system} section={draft.section} />
              ) : null}
            </ReportView>
          ) : (
            <Text role="status">No report yet: {checkWords(submission)}.</Text>
          )}
          <ReviewTabs submission={submission} />
        </View>
        <View style={{ width: wide ? DECISION_WIDTH : '100%', gap: space.two }}>
          <StaleLine submission={submission} />
          {isCurator && isOpen ? <DecisionForm submission={submission} etag={etag} /> : null}
          {isMine && isOpen ? <WithdrawButton id={submission.id} /> : null}
        </View>
      </View>
    </Page>
  );
}

/** A report of an older engine, or a check that broke: one button checks again. */
function StaleLine({ submission }: { submission: Submission }) {
  const recheck = useRecheckSubmission();
  const { checkState, report, reportIsCurrent, failure } = submission;
  const isStale = checkState === 'stale' || checkState === 'failed' || (report !== null && !reportIsCurrent);
  if (!isStale) return null;
  return (
    <View style={{ gap: space.one, alignItems: 'flex-start' }}>
      <Text tone="ochre">{failure ? failure.message : 'Checked by an older engine.'}</Text>
      <RefusedFields error={recheck.error} what="Checking again" />
      <Button onPress={() => recheck.mutate({ id: submission.id })}>Check again</Button>
    </View>
  );
}
