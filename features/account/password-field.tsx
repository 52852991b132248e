import { useState } from 'react';
import { Field, TextButton } from '@/features/ui';

interface Props {
  value: string;
  onChangeText: (text: string) => void;
  /** A new password, with the rule under it. */
  isNew?: boolean;
  error?: string | null;
}

/** A password with a button that shows it. */
export function PasswordField({ value, onChangeText, isNew = false, error = null }: Props) {
  const [isShown, setShown] = useState(false);
  return (
    <Field
      label={isNew ? 'New password' : 'Password'}
      name="password"
      type={isShown ? 'text' : 'password'}
      autoComplete={isNew ? 'new-password' : 'current-password'}
      value={value}
      onChangeText={onChangeText}
      required
      error={error}
      {...(isNew && { hint: '12 characters or more, at most 72 bytes' })}
      trailing={
        <TextButton
          size={14}
          name={isShown ? 'Hide password' : 'Show password'}
          onPress={() => setShown((shown) => !shown)}
        >
          {isShown ? 'Hide' : 'Show'}
        </TextButton>
      }
    />
  );
}
