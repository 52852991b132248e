import { type RefObject, useEffect, useLayoutEffect } from 'react';

const FOCUSABLE =
  'a[href], button, input:not([type="hidden"]), select, textarea, summary, [tabindex]:not([tabindex="-1"])';

const focusableIn = (box: HTMLElement): HTMLElement[] =>
  [...box.querySelectorAll<HTMLElement>(FOCUSABLE)].filter((item) => !item.hasAttribute('disabled'));

function keepInside(event: KeyboardEvent, box: HTMLElement): void {
  const items = focusableIn(box);
  const first = items[0];
  const last = items.at(-1);
  if (!first || !last) {
    event.preventDefault();
    return;
  }
  const active = document.activeElement;
  const outside = !box.contains(active) || active === box;
  if (event.shiftKey && (active === first || outside)) {
    event.preventDefault();
    last.focus();
  } else if (!event.shiftKey && (active === last || outside)) {
    event.preventDefault();
    first.focus();
  }
}

/** While open: focus moves in, stays in, Escape closes, and focus goes back where it was. */
export function useFocusTrap(open: boolean, boxRef: RefObject<HTMLElement | null>, onClose: () => void): void {
  // Before the effects of what is inside, which may put the focus on something better.
  useLayoutEffect(() => {
    const box = boxRef.current;
    if (!open || !box) return undefined;
    const before = document.activeElement;
    const start = box.querySelector<HTMLElement>('[data-autofocus], [autofocus]') ?? box;
    start.focus();
    return () => {
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, [open, boxRef]);

  useEffect(() => {
    if (!open) return undefined;
    const listen = (event: KeyboardEvent) => {
      const box = boxRef.current;
      if (!box || event.defaultPrevented) return;
      if (event.key === 'Escape') {
        event.preventDefault();
        event.stopPropagation();
        onClose();
      } else if (event.key === 'Tab') keepInside(event, box);
    };
    document.addEventListener('keydown', listen);
    return () => document.removeEventListener('keydown', listen);
  }, [open, boxRef, onClose]);
}
