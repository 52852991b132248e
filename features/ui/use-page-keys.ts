import { useEffect, useRef } from 'react';

type KeyActions = Readonly<Record<string, (event: KeyboardEvent) => void>>;

/** A field has the focus, or a sheet or menu is open: letters belong to it. */
const isTaken = ({ target }: KeyboardEvent): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable ||
    /^(?:INPUT|TEXTAREA|SELECT)$/.test(target.tagName) ||
    target.closest('[role="dialog"], [role="menu"]') !== null);

/** Enter on a link or a button follows or presses it. */
const pressesSomething = ({ key, target }: KeyboardEvent): boolean =>
  (key === 'Enter' || key === ' ') &&
  target instanceof HTMLElement &&
  target.closest('a, button, [role="slider"]') !== null;

/** Single keys that act on the whole page, by the key's name; never while a field has the focus or with a modifier. */
export function usePageKeys(actions: KeyActions): void {
  const latest = useRef(actions);
  useEffect(() => {
    latest.current = actions;
  });
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (
        event.defaultPrevented ||
        event.ctrlKey ||
        event.metaKey ||
        event.altKey ||
        isTaken(event) ||
        pressesSomething(event)
      )
        return;
      const action = latest.current[event.key];
      if (!action) return;
      event.preventDefault();
      action(event);
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, []);
}
