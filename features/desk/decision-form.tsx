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

interface Props {
  submission: Submission;
  etag: string | null;
}

/** What a curator has chosen and written, and the recording of it. */
function useDecision({ submission, etag }: Props) {
  const decide = useDecideSubmission();
  const claim = useClaimSubmission();
  const announce = useAnnounce();
  const [choice, setChoice] = useState<Choice | null>(null);
  const [reason, setReason] = useState<ReasonCode>('does-not-close');
  const [comment, setComment] = useState('');
  const { id } = submission;
  const needsWords = choice !== 'accept' && comment.trim() === '';
  const missing = choice === null ? 'Choose first.' : needsWords ? 'A reason in words is needed.' : null;
  const record = () => {
    if (missing !== null || choice === null || decide.isPending) return;
    const decision: Decision = {
      decision: choice,
      ...(choice !== 'accept' && { reason }),
      ...(comment.trim() && { comment }),
    };
    const said = (accession: string | null) => (accession ? `In the catalogue as ${accession}` : 'Recorded');
    decide.mutate({ id, etag, decision }, { onSuccess: ({ data }) => announce(said(data.accession)) });
  };
  const write = (text: string) => {
    // The first keystroke takes the lease.
    if (comment === '' && submission.claim === null) claim.mutate({ id });
    setComment(text);
  };
  return {
    decide,
    claim: () => claim.mutate({ id }),
    choice,
    setChoice,
    reason,
    setReason,
    comment,
    write,
    missing,
    record,
  };
}

/** Accept, return or decline, with a reason that is kept for ever. */
export function DecisionForm({ submission, etag }: Props) {
  const form = useDecision({ submission, etag });
  const { choice, setChoice, comment, decide, missing, record } = form;
  const { isMine } = submission;
  const select = (one: Choice) => () => setChoice(one);
  usePageKeys(isMine ? {} : { a: select('accept'), r: select('return'), d: select('decline'), c: form.claim });
  if (isMine) return <Text>You own this submission; another curator decides.</Text>;
  return (
    <Form name="Decision" onSubmit={record}>
      <View style={{ gap: space.two }}>
        <Heading level={2}>Decision</Heading>
        <Text size={14} tone="muted">
          On revision {submission.revision}.
        </Text>
        <Choices submission={submission} choice={choice} onChoose={setChoice} />
        {choice === 'return' || choice === 'decline' ? (
          <Select label="Reason" value={form.reason} onChange={form.setReason} options={reasons} />
        ) : null}
        <TextArea
          label="Reason, shown to the contributor and kept for ever"
          value={comment}
          onChangeText={form.write}
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
          <Text mono>Ctrl ↵</Text> records. If the submission changed meanwhile, nothing is recorded.
        </Text>
      </View>
    </Form>
  );
}

interface ChoicesProps {
  submission: Submission;
  choice: Choice | null;
  onChoose: (choice: Choice) => void;
}

function Choices({ submission, choice, onChoose }: ChoicesProps) {
  const hint = 'enters the catalogue with the next number';
  return (
    <RadioGroup<Choice>
      legend="Decision"
      hideLegend
      value={choice}
      onChange={onChoose}
      options={[
        { value: 'accept', label: 'Accept', hint, keyHint: 'a', disabledBecause: hindrance(submission) },
        { value: 'return', label: 'Return', hint: 'edit and send again; reason needed', keyHint: 'r' },
        { value: 'decline', label: 'Decline', hint: 'reason needed', keyHint: 'd' },
      ]}
    />
  );
}
