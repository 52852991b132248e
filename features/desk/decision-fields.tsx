import { isRefusal } from '@/features/api/api-error';
import { RefusedFields } from '@/features/checking/refused-fields';
import { ChangedMeanwhile } from '@/features/desk/changed-meanwhile';
import { reasonWords } from '@/features/desk/reason-words';
import type { useDecision } from '@/features/desk/use-decision';
import { Select, TextArea } from '@/features/ui';
import type { ReasonCode, Submission } from '@/schemas/generated/contract';

const reasons = Object.entries(reasonWords).map(([value, label]) => ({ value: value as ReasonCode, label }));

interface DecisionFieldsProps {
  submission: Submission;
  form: ReturnType<typeof useDecision>;
}

/** The reason of a decision, and why it was not recorded. */
export function DecisionFields({ submission, form }: DecisionFieldsProps) {
  const { choice, comment, decide } = form;
  return (
    <>
      {choice === 'return' || choice === 'decline' ? (
        <Select label="What is wrong" value={form.reason} onChange={form.setReason} options={reasons} />
      ) : null}
      <TextArea
        label="Reason, shown to the contributor and kept for ever"
        value={comment}
        onChangeText={form.write}
        areaRef={form.reasonField}
      />
      {isRefusal(decide.error, 'precondition-failed') ? (
        <ChangedMeanwhile submission={submission} comment={comment} />
      ) : (
        <RefusedFields error={decide.error} what="The decision" />
      )}
    </>
  );
}
