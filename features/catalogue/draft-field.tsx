import { type ReactNode, useState } from 'react';
import { Field } from '@/features/ui';

export interface DraftFieldProps {
  label: ReactNode;
  showLabel?: boolean;
  value: string;
  /** What counts as finished; until then it is only kept in the field. */
  form: RegExp;
  /** What it has to be: "a positive number". */
  wrong: string;
  placeholder?: string;
  onCommit: (value: string) => void;
  /** A phone shows its letters, not its number keys. */
  letters?: boolean;
}

/** A field of a filter: what is finished goes into the search, what is not stays as typed. */
export function DraftField({ label, showLabel, value, form, wrong, placeholder, onCommit, letters }: DraftFieldProps) {
  const [draft, setDraft] = useState<{ text: string; over: string } | null>(null);
  // A draft holds only over the value it was typed over: when the search changes otherwise, the search wins.
  const text = draft && draft.over === value ? draft.text : value;
  const isUnfinished = text !== '' && !form.test(text.trim());
  return (
    <Field
      label={label}
      hideLabel={!showLabel}
      mono
      decimal={!letters}
      value={text}
      error={isUnfinished ? `Needs ${wrong}.` : null}
      {...(placeholder && { placeholder })}
      onChangeText={(next) => {
        const finished = next.trim() === '' || form.test(next.trim());
        setDraft({ text: next, over: finished ? next.trim() : value });
        if (finished) onCommit(next.trim());
      }}
    />
  );
}
