import { useEffect } from 'react';
import { router, type Href } from 'expo-router';

/** Second letters after `g`. */
const PLACES: Record<string, Href> = { c: '/', s: '/systems', b: '/bench', d: '/desk' };
/** How long `g` waits for its second letter. */
const PATIENCE_MS = 1200;

/** `g` then `c`, `s`, `b` or `d` goes to one of the four places; never while a field has the focus. */
export function usePlaceKeys(): void {
  useEffect(() => {
    let begun = -Infinity;
    const onKey = (event: KeyboardEvent) => {
      if (event.key.length > 1 || isTyping(event) || event.ctrlKey || event.metaKey || event.altKey) return;
      const place = event.timeStamp - begun < PATIENCE_MS ? PLACES[event.key] : undefined;
      begun = event.key === 'g' ? event.timeStamp : -Infinity;
      if (!place) return;
      event.preventDefault();
      event.stopImmediatePropagation();
      router.push(place);
    };
    window.addEventListener('keydown', onKey, { capture: true });
    return () => window.removeEventListener('keydown', onKey, { capture: true });
  }, []);
}

const isTyping = ({ target }: KeyboardEvent): boolean =>
  target instanceof HTMLElement && (target.isContentEditable || /^(?:INPUT|TEXTAREA|SELECT)$/.test(target.tagName));
