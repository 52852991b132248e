import { View } from 'react-native';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { draftOfBody } from '@/features/checking/orbit-draft';
import { ChoiceList } from '@/features/desk/choice-list';
import { DecisionFields } from '@/features/desk/decision-fields';
import { standsOn } from '@/features/desk/hindrance';
import { recordLabels } from '@/features/desk/record-labels';
import type { useDecision } from '@/features/desk/use-decision';
import { useNow } from '@/features/desk/use-now';
import { withIt } from '@/features/desk/with-it';
import { Button, Form, Heading, space, Text } from '@/features/ui';
import type { Submission, System } from '@/schemas/generated/contract';

interface DecisionFormProps {
  submission: Submission;
  system: System | undefined;
  form: ReturnType<typeof useDecision>;
}

/** Accept, return or decline, with a reason that is kept for ever. */
export function DecisionForm({ submission, system, form }: DecisionFormProps) {
  const { choice, setChoice, decide, missing, record } = form;
  const now = useNow();
  const orbit = submission.report && closedOrbit(submission.report);
  const gain = orbit && withIt(orbit, system, draftOfBody(submission.body));
  return (
    <Form name="Decision" onSubmit={record}>
      <View style={{ gap: space.two }}>
        <View>
          <Heading level={2}>Decision</Heading>
          <Text size={14} tone="muted">
            {standsOn(submission, now)}
          </Text>
        </View>
        <ChoiceList submission={submission} choice={choice} onChoose={setChoice} />
        <DecisionFields submission={submission} form={form} />
        <Button filled wide submit disabledBecause={decide.isPending ? 'Recording…' : missing}>
          {choice ? recordLabels[choice] : 'Record'}
        </Button>
        <Text size={13} tone="muted">
          <Text mono>Ctrl ↵</Text> records. If the submission changed meanwhile, nothing is recorded and you see what
          changed.
        </Text>
        {gain ? (
          <Text size={14} tone="muted">
            {gain}
          </Text>
        ) : null}
      </View>
    </Form>
  );
}
