import type { ReactNode } from 'react';

export interface TextButtonProps {
  children: ReactNode;
  onPress: () => void;
  name?: string;
  size?: 13 | 14 | 16;
  disabled?: boolean;
  expanded?: boolean;
  /** Id of what explains it. */
  describedBy?: string;
}

/** A button that looks like a link: small actions beside text. Its touch target is 44 px high. */
export function TextButton({ children, onPress, name, size = 16, disabled, expanded, describedBy }: TextButtonProps) {
  return (
    <button
      type="button"
      className={`r-link r-target r-reading${size < 16 ? ' r-small' : ''}`}
      onClick={() => {
        if (!disabled) onPress();
      }}
      {...(name && { 'aria-label': name })}
      {...(disabled && { 'aria-disabled': true })}
      {...(expanded !== undefined && { 'aria-expanded': expanded })}
      {...(describedBy && { 'aria-describedby': describedBy })}
    >
      {children}
    </button>
  );
}
