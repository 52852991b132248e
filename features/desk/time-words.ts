const MINUTE = 60_000;
const HOUR = 60 * MINUTE;
const DAY = 24 * HOUR;

const ago = (ms: number): string => {
  if (ms < MINUTE) return 'just now';
  if (ms < HOUR) return `${Math.floor(ms / MINUTE)} min`;
  if (ms < DAY) return `${Math.floor(ms / HOUR)} h`;
  const days = Math.floor(ms / DAY);
  return days === 1 ? '1 day' : `${days} days`;
};

/** How long something has lasted: "just now", "4 min", "3 h", "2 days". */
export const ageWords = (since: string, now: number): string => ago(Math.max(0, now - Date.parse(since)));

/** What is left of a lease, in minutes. */
export const minutesLeft = (until: string, now: number): number =>
  Math.max(0, Math.round((Date.parse(until) - now) / MINUTE));

/** Time of day as the clock beside one shows it. */
export const clockTime = (at: string): string =>
  new Date(at).toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });
