import { useEffect } from 'react';
import { View } from 'react-native';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { useDesk } from '@/features/desk/desk-context';
import { DecisionForm } from '@/features/desk/decision-form';
import { DecisionStrip } from '@/features/desk/decision-strip';
import { decisionWords } from '@/features/desk/reason-words';
import { RecordedLine } from '@/features/desk/recorded-line';
import { ReviewHead } from '@/features/desk/review-head';
import { ReviewReport } from '@/features/desk/review-report';
import { ReviewTabs } from '@/features/desk/review-tabs';
import { StaleLine } from '@/features/desk/stale-line';
import { useDecisionKeys } from '@/features/desk/use-decision-keys';
import { useDecision } from '@/features/desk/use-decision';
import { WithdrawButton } from '@/features/desk/withdraw-button';
import { LinkText, space, Text, useContainerWidth, useLayout } from '@/features/ui';
import type { Submission, System } from '@/schemas/generated/contract';

interface ReviewProps {
  submission: Submission;
  etag: string | null;
  systems: readonly System[];
  isCurator: boolean;
}

/** Width of the decision, px: 33 staff spaces. */
const DECISION_WIDTH = 264;
/** From here on the decision has room beside the review, px. */
const ROOM_FOR_DECISION = 760;

/** One submission with its report, beside its nearest entries; curators decide at the right, on a phone from the strip. */
export function Review({ submission, etag, systems, isCurator }: ReviewProps) {
  const phone = useLayout() === 'phone';
  const beside = useContainerWidth() >= ROOM_FOR_DECISION;
  const { body, isMine, reviewState } = submission;
  const system = systems.find(({ slug }) => slug === draftOfBody(body).system);
  const isOpen = reviewState === 'submitted' || reviewState === 'in-review';
  const decides = isCurator && isOpen && !isMine;
  const form = useDecision(submission, etag, decides);
  useDecisionKeys(form, decides);
  useHeadingFocus(submission.id);
  return (
    <View style={beside ? { flexDirection: 'row', alignItems: 'flex-start', gap: space.six } : { gap: space.four }}>
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: beside ? 0 : 'auto', minWidth: 0 }}>
        <ReviewHead submission={submission} system={system} decides={decides}>
          <View style={{ gap: space.three }}>
            <Outcome submission={submission} />
            {phone ? <StaleLine submission={submission} /> : null}
            <ReviewReport submission={submission} system={system} />
            <ReviewTabs submission={submission} system={system} />
          </View>
        </ReviewHead>
      </View>
      <section
        className={beside ? 'r-side' : undefined}
        aria-label="What to do with it"
        style={{ width: beside ? DECISION_WIDTH : '100%' }}
      >
        <View style={{ gap: space.two }}>
          {phone ? null : <StaleLine submission={submission} />}
          {decides && !phone ? <DecisionForm submission={submission} system={system} form={form} /> : null}
          {isMine && isOpen ? (
            <>
              {isCurator ? <Text>You own this submission; another curator decides.</Text> : null}
              <WithdrawButton id={submission.id} />
            </>
          ) : null}
        </View>
      </section>
      {decides && phone ? <DecisionStrip submission={submission} form={form} /> : null}
    </View>
  );
}

/** Coming from another page of the Desk, one goes on reading at the heading. */
function useHeadingFocus(id: string): void {
  const { hasMoved } = useDesk();
  useEffect(() => {
    if (!hasMoved()) return undefined;
    // The frame gives a new page's focus to its content first.
    const frame = requestAnimationFrame(() =>
      document.querySelector<HTMLElement>('main [role="heading"][aria-level="1"]')?.focus({ preventScroll: true }),
    );
    return () => cancelAnimationFrame(frame);
  }, [id, hasMoved]);
}

/** What came of it, and what was decided just before. */
function Outcome({ submission }: { submission: Submission }) {
  const { id, accession, decision } = submission;
  return (
    <>
      <RecordedLine id={id} />
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
    </>
  );
}
