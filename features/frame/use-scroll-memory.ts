import { useEffect, useRef } from 'react';

/** Where the page was scrolled to when each address was left; the newest visit counts. */
const places = new Map<string, number>();

/**
 * Start every new page at its top with the focus on its content, and come back to where one was with the
 * browser's own back and forward.
 */
export function useScrollMemory(pathname: string, contentId: string): void {
  const cameByHistory = useRef(false);
  const former = useRef<string | null>(null);

  useEffect(() => {
    const remember = () => void places.set(window.location.pathname, window.scrollY);
    const onHistory = () => {
      cameByHistory.current = true;
    };
    window.history.scrollRestoration = 'manual';
    window.addEventListener('scroll', remember, { passive: true });
    window.addEventListener('popstate', onHistory);
    return () => {
      window.removeEventListener('scroll', remember);
      window.removeEventListener('popstate', onHistory);
    };
  }, []);

  useEffect(() => {
    if (former.current !== null && former.current !== pathname) {
      const back = cameByHistory.current ? places.get(pathname) : undefined;
      window.scrollTo(0, back ?? 0);
      if (back === undefined) document.getElementById(contentId)?.focus({ preventScroll: true });
    }
    cameByHistory.current = false;
    former.current = pathname;
  }, [pathname, contentId]);
}
