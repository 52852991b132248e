/** What a curator wrote and has not recorded, one text a submission; it lasts as long as the tab. */
const PREFIX = 'ritornel-reason-';

/** Storage may be full or forbidden; then the text lives as long as the page. */
function attempt<T>(work: () => T): T | null {
  try {
    return work();
  } catch {
    return null;
  }
}

/** Keep what was written about a submission; nothing is kept of an empty text. */
export function keepReason(id: string, text: string): void {
  attempt(() => {
    if (text === '') sessionStorage.removeItem(PREFIX + id);
    else sessionStorage.setItem(PREFIX + id, text);
  });
}

/** What was written about a submission before; empty when nothing was. */
export const keptReason = (id: string): string => attempt(() => sessionStorage.getItem(PREFIX + id)) ?? '';
