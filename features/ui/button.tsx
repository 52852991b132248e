import { type ReactNode, type Ref, useId } from 'react';
import { followLink } from './follow-link';

export interface ButtonProps {
  children: ReactNode;
  onPress?: () => void;
  /** A button that leads somewhere is a link that looks like one. */
  href?: string;
  /** The one thing most people came to do; one a screen. */
  filled?: boolean;
  /** As wide as its container. */
  wide?: boolean;
  /** Regular weight: the buttons of a strip. */
  quiet?: boolean;
  /** Why it can't be used now. It stays in the tab order and says so. */
  disabledBecause?: string | null | undefined;
  /** Shows ▾: it opens a menu or a sheet. */
  opens?: 'menu' | 'dialog';
  expanded?: boolean;
  /** Sends the form it stands in. */
  submit?: boolean;
  name?: string;
  download?: string;
  /** As `aria-keyshortcuts` writes it. */
  keys?: string;
  buttonRef?: Ref<HTMLButtonElement>;
}

const className = ({ filled, wide, quiet }: ButtonProps): string =>
  ['r-button', filled && 'r-filled', wide && 'r-wide', quiet && 'r-quiet'].filter(Boolean).join(' ');

function LinkButton(props: ButtonProps & { href: string }) {
  const { href, children, onPress, name, download } = props;
  return (
    <a
      href={href}
      className={className(props)}
      onClick={(event) => {
        onPress?.();
        followLink(event, href);
      }}
      {...(name && { 'aria-label': name })}
      {...(download !== undefined && { download })}
    >
      {children}
    </a>
  );
}

/** A button of 44 px. */
export function Button(props: ButtonProps) {
  const { children, onPress, href, disabledBecause, opens, expanded, submit, name, keys, buttonRef } = props;
  const reasonId = useId();
  const disabled = Boolean(disabledBecause);
  if (href !== undefined && !disabled) return <LinkButton {...props} href={href} />;
  return (
    <>
      <button
        {...(buttonRef && { ref: buttonRef })}
        type={submit ? 'submit' : 'button'}
        className={className(props)}
        onClick={(event) => {
          if (disabled) event.preventDefault();
          else onPress?.();
        }}
        {...(name && { 'aria-label': name })}
        {...(keys && { 'aria-keyshortcuts': keys })}
        {...(opens && { 'aria-haspopup': opens, 'aria-expanded': expanded ?? false })}
        {...(disabled && { 'aria-disabled': true, 'aria-describedby': reasonId, title: disabledBecause ?? '' })}
      >
        {children}
        {opens === 'menu' ? <span aria-hidden="true">▾</span> : null}
      </button>
      {disabled ? (
        <span id={reasonId} className="r-hidden">
          {disabledBecause}
        </span>
      ) : null}
    </>
  );
}
