import type { ReactNode } from 'react';

export interface StripProps {
  /** At most four buttons. */
  children: ReactNode;
  /** What they act on, for a screen reader. */
  name?: string;
}

/** The page's actions on a phone, directly above the bar of places. */
export function Strip({ children, name = 'Actions' }: StripProps) {
  return (
    <div className="r-strip" role="group" aria-label={name}>
      {children}
    </div>
  );
}
