const dates = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric', timeZone: 'UTC' });

/** A day as text: "14 March 2026", in universal time, so that everyone reads the same. */
export const longDate = (iso: string): string => dates.format(new Date(iso));
