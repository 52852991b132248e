import { followLink } from './follow-link';

/** One of the four places. */
export interface Place {
  href: string;
  label: string;
  active: boolean;
  /** How many things wait there for this person; nothing is shown at zero. */
  waiting?: number;
  /** Instead of following the link when the place is already shown. */
  onPressAgain?: () => void;
}

/** A place in the masthead or the bar. */
export function PlaceLink({ place }: { place: Place }) {
  const { href, label, active, waiting = 0, onPressAgain } = place;
  return (
    <a
      href={href}
      className="r-place"
      {...(active && { 'aria-current': 'page' as const })}
      {...(waiting > 0 && { 'aria-label': `${label}, ${waiting} ${waiting === 1 ? 'waits' : 'wait'} for you` })}
      onClick={(event) => {
        if (active && onPressAgain && !event.metaKey && !event.ctrlKey) {
          event.preventDefault();
          onPressAgain();
        } else followLink(event, href);
      }}
    >
      {label}
      {waiting > 0 ? (
        <span className="r-place-count" aria-hidden="true">
          {waiting}
        </span>
      ) : null}
    </a>
  );
}
