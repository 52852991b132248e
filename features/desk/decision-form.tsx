import { useState } from 'react';
import { View } from 'react-native';
import { isRefusal } from '@/features/api/api-error';
import { useClaimSubmission, useDecideSubmission } from '@/features/api/submissions';
import { RefusedFields } from '@/features/checking/refused-fields';
import { ChangedMeanwhile } from '@/features/desk/changed-meanwhile';
import { reasonWords } from '@/features/desk/reason-words';
import {
  Button,
  Form,
  Heading,
  RadioGroup,
  Select,
  space,
  Text,
  TextArea,
  useAnnounce,
  usePageKeys,
} from '@/features/ui';
import type { Decision, ReasonCode, Submission } from '@/schemas/generated/contract';

type Choice = Decision['decision'];

const reasons = Object.entries(reasonWords).map(([value, label]) => ({ value: value as ReasonCode, label }));
const buttons: Readonly<Record<Choice, string>> = {
  accept: 'Accept as the next entry',
  return: 'Return to the contributor',
  decline: 'Decline',
};

/** Why a submission cannot be accepted now; null when it can. */
function hindrance({ report, reportIsCurrent, checkState }: Submission): string | null {
  if (checkState === 'queued' || checkState === 'running') return 'Its check is not done yet.';
  if (report === null) return 'There is no report of this revision.';
  return reportIsCurrent ? null : 'Checked by an older engine: check again first.';
}

/** Accept, return or decline, with a reason that is kept for ever. */
export function DecisionForm({ submission, etag }: { submission: Submission; etag: string | null }) {
  const decide = useDecideSubmission();
  const claim = useClaimSubmission();
  const announce = useAnnounce();
  const [choice, setChoice] = useState<Choice | null>(null);
  const [reason, setReason] = useState<ReasonCode>('does-not-close');
  const [comment, setComment] = useState('');
  const isMine = submission.isMine;
  usePageKeys(
    isMine
      ? {}
      : {
          a: () => setChoice('accept'),
          r: () => setChoice('return'),
          d: () => setChoice('decline'),
          c: () => claim.mutate({ id: submission.id }),
        },
  );
  if (isMine) return <Text>You own this submission; another curator decides.</Text>;
  const missing =
    choice === null
      ? 'Choose first.'
      : choice !== 'accept' && comment.trim() === ''
        ? 'A reason in words is needed.'
        : null;
  const record = () => {
    if (missing || choice === null) return;
    const decision: Decision = {
      decision: choice,
      ...(choice !== 'accept' && { reason }),
      ...(comment.trim() && { comment }),
    };
    decide.mutate(
      { id: submission.id, etag, decision },
      { onSuccess: ({ data }) => announce(data.accession ? `In the catalogue as ${data.accession}` : 'Recorded') },
    );
  };
  const onComment = (text: string) => {
    if (comment === '' && submission.claim === null) claim.mutate({ id: submission.id });
    setComment(text);
  };
  return (
    <Form name="Decision" onSubmit={record}>
      <View style={{ gap: space.two }}>
        <Heading level={2}>Decision</Heading>
        <Text size={14} tone="muted">
          On revision {submission.revision}.
        </Text>
        <RadioGroup<Choice>
          legend="Decision"
          hideLegend
          value={choice}
          onChange={setChoice}
          options={[
            {
              value: 'accept',
              label: 'Accept',
              hint: 'enters the catalogue with the next number',
              keyHint: 'a',
              disabledBecause: hindrance(submission),
            },
            { value: 'return', label: 'Return', hint: 'edit and send again; reason needed', keyHint: 'r' },
            { value: 'decline', label: 'Decline', hint: 'reason needed', keyHint: 'd' },
          ]}
        />
        {choice === 'return' || choice === 'decline' ? (
          <Select label="Reason" value={reason} onChange={setReason} options={reasons} />
        ) : null}
        <TextArea
          label="Reason, shown to the contributor and kept for ever"
          value={comment}
          onChangeText={onComment}
          onKeyDown={(event) => {
            if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) record();
          }}
        />
        {isRefusal(decide.error, 'precondition-failed') ? (
          <ChangedMeanwhile submission={submission} comment={comment} />
        ) : (
          <RefusedFields error={decide.error} what="The decision" />
        )}
        <Button filled submit disabledBecause={decide.isPending ? 'Recording…' : missing}>
          {choice ? buttons[choice] : 'Record'}
        </Button>
        <Text size={13} tone="muted">
          <Text mono>Ctrl ↵</Text> records. If the submission changed meanwhile, nothing is recorded and you see what
          changed.
        </Text>
      </View>
    </Form>
  );
}
