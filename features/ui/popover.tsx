import { type KeyboardEvent, type ReactNode, useCallback, useEffect, useRef, useState } from 'react';
import { Button, type ButtonProps } from './button';
import { useLayout } from './layout';
import { Sheet } from './sheet';
import { TextButton } from './text-button';

export interface PopoverProps {
  /** What the button shows. */
  label: ReactNode;
  /** Accessible name of the button, where the label is not enough. */
  name?: string;
  /** Heading of the sheet on a phone, accessible name of the box elsewhere. */
  title: string;
  /** Drawn as a button (default), as a link, or as plain words with ▾. */
  kind?: 'button' | 'quiet' | 'link' | 'words';
  /** Which edge of the button the box keeps to. */
  align?: 'left' | 'right';
  /** px. */
  width?: number;
  role?: 'menu' | 'dialog';
  children: (close: () => void) => ReactNode;
}

/** Close on a press outside. */
function useOutsidePress(open: boolean, box: React.RefObject<HTMLElement | null>, close: () => void): void {
  useEffect(() => {
    if (!open) return undefined;
    const listen = (event: Event) => {
      if (event.target instanceof Node && !box.current?.contains(event.target)) close();
    };
    document.addEventListener('pointerdown', listen);
    return () => document.removeEventListener('pointerdown', listen);
  }, [open, box, close]);
}

function Opener({ kind, label, name, open, role, toggle }: PopoverProps & { open: boolean; toggle: () => void }) {
  if (kind === 'link') {
    return (
      <TextButton onPress={toggle} expanded={open} {...(name && { name })}>
        {label}
      </TextButton>
    );
  }
  if (kind === 'words') {
    return (
      <button
        type="button"
        className="r-words-button"
        onClick={toggle}
        aria-haspopup={role ?? 'menu'}
        aria-expanded={open}
        {...(name && { 'aria-label': name })}
      >
        {label} <span aria-hidden="true">▾</span>
      </button>
    );
  }
  const shape: Partial<ButtonProps> = kind === 'quiet' ? { quiet: true } : {};
  return (
    <Button onPress={toggle} opens="menu" expanded={open} {...shape} {...(name && { name })}>
      {label}
    </Button>
  );
}

/** A button that opens a box under itself; on a phone, a sheet from below. */
export function Popover(props: PopoverProps) {
  const { title, align = 'left', width, role = 'menu', children } = props;
  const [open, setOpen] = useState(false);
  const anchor = useRef<HTMLDivElement>(null);
  const phone = useLayout() === 'phone';
  const close = useCallback(() => setOpen(false), []);
  useOutsidePress(open && !phone, anchor, close);

  const closeToOpener = () => {
    setOpen(false);
    anchor.current?.querySelector('button')?.focus();
  };
  const onKeyDown = (event: KeyboardEvent) => {
    if (event.key !== 'Escape' || !open || phone) return;
    event.stopPropagation();
    closeToOpener();
  };
  return (
    <div ref={anchor} className="r-anchor" role="presentation" onKeyDown={onKeyDown}>
      <Opener {...props} open={open} toggle={() => setOpen((was) => !was)} />
      {open && !phone ? (
        <div className="r-popover" role={role} aria-label={title} style={{ [align]: 0, ...(width && { width }) }}>
          {children(closeToOpener)}
        </div>
      ) : null}
      <Sheet open={open && phone} onClose={close} title={title} footer={<Button onPress={close}>Close</Button>}>
        <div role={role} aria-label={title}>
          {children(close)}
        </div>
      </Sheet>
    </div>
  );
}
