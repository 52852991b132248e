import { type ReactNode, useId } from 'react';

export interface CheckboxProps {
  label: ReactNode;
  checked: boolean;
  onChange: (checked: boolean) => void;
  /** At the right: a count. */
  detail?: ReactNode;
  /** Under the label. */
  hint?: ReactNode;
  error?: string | null;
  disabled?: boolean;
}

/** A box to tick. */
export function Checkbox({ label, checked, onChange, detail, hint, error, disabled }: CheckboxProps) {
  const id = useId();
  const describedBy = [detail && `${id}-detail`, hint && `${id}-hint`, error && `${id}-error`]
    .filter(Boolean)
    .join(' ');
  return (
    <div>
      <div className="r-choice">
        <input
          id={id}
          type="checkbox"
          className="r-check"
          checked={checked}
          onChange={(event) => onChange(event.target.checked)}
          {...(disabled && { disabled })}
          {...(describedBy && { 'aria-describedby': describedBy })}
          {...(error && { 'aria-invalid': true })}
        />
        <label htmlFor={id} className="r-choice-label">
          {label}
        </label>
        {detail ? (
          <span id={`${id}-detail`} className="r-kbd">
            {detail}
          </span>
        ) : null}
      </div>
      {hint ? (
        <div id={`${id}-hint`} className="r-choice-hint">
          {hint}
        </div>
      ) : null}
      {error ? (
        <div id={`${id}-error`} className="r-choice-hint r-choice-error">
          {error}
        </div>
      ) : null}
    </div>
  );
}
