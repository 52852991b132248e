import type { HTMLInputAutoCompleteAttribute, KeyboardEvent, ReactNode, Ref } from 'react';
import { FieldFrame, type FieldFrameProps } from './field-frame';

export interface FieldProps extends FieldFrameProps {
  value: string;
  onChangeText: (text: string) => void;
  placeholder?: string;
  /** Iosevka: the field holds a number or a code. */
  mono?: boolean;
  /** 19 px: the search line. */
  large?: boolean;
  /** Phones show their number keys. */
  decimal?: boolean;
  type?: 'text' | 'password' | 'email' | 'search';
  autoComplete?: HTMLInputAutoCompleteAttribute;
  name?: string;
  maxLength?: number;
  required?: boolean;
  readOnly?: boolean;
  disabled?: boolean;
  /** Words or a small button inside the field, at its right. */
  trailing?: ReactNode;
  onBlur?: () => void;
  onFocus?: () => void;
  onKeyDown?: (event: KeyboardEvent<HTMLInputElement>) => void;
  inputRef?: Ref<HTMLInputElement>;
}

const className = ({ mono, large }: FieldProps): string =>
  ['r-input', mono && 'r-mono', large && 'r-large'].filter(Boolean).join(' ');

/** One line to type in. */
export function Field(props: FieldProps) {
  const { value, onChangeText, trailing, type = 'text', decimal, inputRef } = props;
  const { placeholder, autoComplete, name, maxLength, required, readOnly, disabled, onBlur, onFocus, onKeyDown } =
    props;
  return (
    <FieldFrame {...props}>
      {(wiring) => (
        <div className="r-field">
          <input
            {...wiring}
            {...(inputRef && { ref: inputRef })}
            className={className(props)}
            type={type}
            value={value}
            spellCheck={false}
            autoCapitalize="none"
            autoCorrect="off"
            autoComplete={autoComplete ?? 'off'}
            onChange={(event) => onChangeText(event.target.value)}
            {...{ placeholder, name, maxLength, required, readOnly, disabled, onBlur, onFocus, onKeyDown }}
            {...(decimal && { inputMode: 'decimal' as const })}
          />
          {trailing ? <span className="r-trailing">{trailing}</span> : null}
        </div>
      )}
    </FieldFrame>
  );
}
