import { useEffect, useState } from 'react';

const listeners = new Set<(text: string) => void>();

function announce(text: string): void {
  listeners.forEach((tell) => tell(text));
}

/** A function that says something to a screen reader, politely. */
export const useAnnounce = (): ((text: string) => void) => announce;

/** What `useAnnounce` says; one a page, in the frame. */
export function LiveRegion() {
  const [said, setSaid] = useState({ text: '', turn: 0 });
  useEffect(() => {
    const listen = (text: string) => setSaid(({ turn }) => ({ text, turn: turn + 1 }));
    listeners.add(listen);
    return () => void listeners.delete(listen);
  }, []);
  // A trailing no-break space makes a repeated sentence a new one.
  return (
    <div className="r-hidden" role="status" aria-live="polite">
      {said.turn % 2 ? said.text : said.text && `${said.text}\u00a0`}
    </div>
  );
}
