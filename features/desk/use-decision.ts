import { router } from 'expo-router';
import { useRef, useState } from 'react';
import { submissionHref } from '@/features/api/page-addresses';
import { useClaimSubmission, useDecideSubmission } from '@/features/api/submissions';
import { useDesk } from '@/features/desk/desk-context';
import { keepReason, keptReason } from '@/features/desk/kept-reason';
import { useQueue } from '@/features/desk/use-queue';
import { useAnnounce } from '@/features/ui';
import type { Decision, ReasonCode, Submission } from '@/schemas/generated/contract';

export type Choice = Decision['decision'];

/** What a curator has chosen and written about a submission, and the recording of it; `isOn` for those who may decide. */
export function useDecision(submission: Submission, etag: string | null, isOn: boolean) {
  const { id } = submission;
  const decide = useDecideSubmission();
  const claim = useClaimSubmission();
  const [choice, setChoice] = useState<Choice | null>(null);
  const [reason, setReason] = useState<ReasonCode>('does-not-close');
  const [comment, setComment] = useState(() => keptReason(id));
  const reasonField = useRef<HTMLTextAreaElement>(null);
  const goOn = useGoOn(submission, isOn);
  const needsWords = choice !== 'accept' && comment.trim() === '';
  const missing = choice === null ? 'Choose first.' : needsWords ? 'A reason in words is needed.' : null;
  const record = () => {
    if (missing !== null || choice === null || decide.isPending) return;
    const decision: Decision = {
      decision: choice,
      ...(choice !== 'accept' && { reason }),
      ...(comment.trim() && { comment }),
    };
    const done = (accession: string | null) => {
      keepReason(id, '');
      goOn(choice, accession);
    };
    decide.mutate({ id, etag, decision }, { onSuccess: ({ data }) => done(data.accession) });
  };
  const write = (text: string) => {
    // The first keystroke takes the lease.
    if (comment === '' && submission.claim === null) claim.mutate({ id });
    setComment(text);
    keepReason(id, text);
  };
  const takeLease = () => {
    if (submission.claim === null) claim.mutate({ id });
  };
  return { decide, reasonField, takeLease, choice, setChoice, reason, setReason, comment, write, missing, record };
}

/** After a decision the next one of the curator's turn opens; when none is left, the page stays and shows what it is now. */
function useGoOn({ id, number }: Submission, isOn: boolean): (decision: Choice, accession: string | null) => void {
  const { waiting } = useQueue(isOn);
  const { setRecorded } = useDesk();
  const announce = useAnnounce();
  return (decision, accession) => {
    announce(accession ? `In the catalogue as ${accession}` : 'Recorded');
    const at = waiting.findIndex((item) => item.id === id);
    const rest = waiting.filter((item) => item.id !== id);
    const next = rest[Math.max(0, at)] ?? rest[0];
    if (!next) return;
    setRecorded({ number, decision, accession, toldOn: next.id });
    router.push(submissionHref(next.id));
  };
}
