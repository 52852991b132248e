import { useEffect } from 'react';

const takesText = (target: EventTarget | null): boolean =>
  target instanceof HTMLTextAreaElement ||
  (target instanceof HTMLInputElement && !/^(checkbox|radio|range|button|submit)$/.test(target.type));

/** Marks the document while a text field has the focus on a touch screen, so that strip and bar leave the keyboard its room. */
export function useTypingMark(): void {
  useEffect(() => {
    const touch = window.matchMedia('(pointer: coarse)');
    const mark = (event: FocusEvent) => {
      if (touch.matches && takesText(event.target)) document.documentElement.dataset['typing'] = '';
    };
    const unmark = () => delete document.documentElement.dataset['typing'];
    document.addEventListener('focusin', mark);
    document.addEventListener('focusout', unmark);
    return () => {
      document.removeEventListener('focusin', mark);
      document.removeEventListener('focusout', unmark);
    };
  }, []);
}
