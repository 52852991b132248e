import type { KeyboardEvent, Ref } from 'react';
import { FieldFrame, type FieldFrameProps } from './field-frame';

export interface TextAreaProps extends FieldFrameProps {
  value: string;
  onChangeText: (text: string) => void;
  rows?: number;
  placeholder?: string;
  mono?: boolean;
  maxLength?: number;
  required?: boolean;
  disabled?: boolean;
  name?: string;
  onBlur?: () => void;
  onFocus?: () => void;
  onKeyDown?: (event: KeyboardEvent<HTMLTextAreaElement>) => void;
  areaRef?: Ref<HTMLTextAreaElement>;
}

/** Several lines to type in. */
export function TextArea(props: TextAreaProps) {
  const { value, onChangeText, rows = 4, mono, areaRef } = props;
  const { placeholder, maxLength, required, disabled, name, onBlur, onFocus, onKeyDown } = props;
  return (
    <FieldFrame {...props}>
      {(wiring) => (
        <textarea
          {...wiring}
          {...(areaRef && { ref: areaRef })}
          className={mono ? 'r-input r-mono' : 'r-input'}
          rows={rows}
          value={value}
          spellCheck={!mono}
          onChange={(event) => onChangeText(event.target.value)}
          {...{ placeholder, maxLength, required, disabled, name, onBlur, onFocus, onKeyDown }}
        />
      )}
    </FieldFrame>
  );
}
