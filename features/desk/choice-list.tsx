import { hindrance } from '@/features/desk/hindrance';
import type { Choice } from '@/features/desk/use-decision';
import { RadioGroup } from '@/features/ui';
import type { Submission } from '@/schemas/generated/contract';

interface ChoiceListProps {
  submission: Submission;
  choice: Choice | null;
  onChoose: (choice: Choice) => void;
}

/** The three decisions and what follows from each. */
export function ChoiceList({ submission, choice, onChoose }: ChoiceListProps) {
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
