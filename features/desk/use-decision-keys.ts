import { useEffect, useRef } from 'react';
import type { useDecision } from '@/features/desk/use-decision';
import { usePageKeys } from '@/features/ui';

/** `a`, `r`, `d` choose, what needs a reason goes on in its field; `c` claims; `Ctrl Enter` records, wherever the focus is. */
export function useDecisionKeys(form: ReturnType<typeof useDecision>, isOn: boolean): void {
  const { setChoice, reasonField, takeLease } = form;
  const withReason = (choice: 'return' | 'decline') => () => {
    setChoice(choice);
    reasonField.current?.focus();
  };
  usePageKeys(
    isOn ? { a: () => setChoice('accept'), r: withReason('return'), d: withReason('decline'), c: takeLease } : {},
  );
  const latest = useRef(form.record);
  useEffect(() => {
    latest.current = form.record;
  });
  useEffect(() => {
    if (!isOn) return undefined;
    const onKey = (event: KeyboardEvent) => {
      if (event.key === 'Enter' && (event.ctrlKey || event.metaKey)) latest.current();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [isOn]);
}
