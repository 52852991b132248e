import { useState } from 'react';
import { DecisionFields } from '@/features/desk/decision-fields';
import { hindrance, standsOn } from '@/features/desk/hindrance';
import { recordLabels } from '@/features/desk/record-labels';
import type { Choice, useDecision } from '@/features/desk/use-decision';
import { useNow } from '@/features/desk/use-now';
import { Button, Sheet, Strip, Text } from '@/features/ui';
import type { Submission } from '@/schemas/generated/contract';

interface DecisionStripProps {
  submission: Submission;
  form: ReturnType<typeof useDecision>;
}

const verbs: Readonly<Record<Choice, string>> = { accept: 'Accept', return: 'Return', decline: 'Decline' };

/** On a phone: the three decisions in the strip, each with its sheet. */
export function DecisionStrip({ submission, form }: DecisionStripProps) {
  const [isOpen, setOpen] = useState(false);
  const now = useNow();
  const { choice, setChoice, decide, missing, record } = form;
  const choose = (one: Choice) => () => {
    setChoice(one);
    setOpen(true);
  };
  return (
    <>
      <Strip name="Decision">
        <Button quiet onPress={choose('decline')}>
          {verbs.decline}
        </Button>
        <Button quiet onPress={choose('return')}>
          {verbs.return}
        </Button>
        <Button filled onPress={choose('accept')} disabledBecause={hindrance(submission)}>
          {verbs.accept}
        </Button>
      </Strip>
      {choice ? (
        <Sheet
          open={isOpen}
          onClose={() => setOpen(false)}
          title={`${verbs[choice]} submission ${submission.number}`}
          footer={
            <>
              <Button onPress={() => setOpen(false)}>Cancel</Button>
              <Button filled onPress={record} disabledBecause={decide.isPending ? 'Recording…' : missing}>
                {recordLabels[choice]}
              </Button>
            </>
          }
        >
          <Text size={14} tone="muted">
            {standsOn(submission, now)}
          </Text>
          <DecisionFields submission={submission} form={form} />
        </Sheet>
      ) : null}
    </>
  );
}
