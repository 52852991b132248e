import { emptyDraft, type OrbitDraft } from '@/features/checking/orbit-draft';

/** Where the Bench keeps what was typed, one draft a system, on this device. */
const PREFIX = 'ritornel-bench-';
const LAST = `${PREFIX}last`;

/** Storage may be full or forbidden; then the draft lives as long as the page. */
function attempt<T>(work: () => T): T | null {
  try {
    return work();
  } catch {
    return null;
  }
}

/** Keep a draft; it is also the one that comes back next time. */
export function keepDraft(draft: OrbitDraft): void {
  attempt(() => {
    localStorage.setItem(`${PREFIX}${draft.system}`, JSON.stringify(draft));
    localStorage.setItem(LAST, draft.system);
  });
}

/** The draft kept for a system; the last one worked on when none is named; null when there is none. */
export function keptDraft(system: string | null): OrbitDraft | null {
  return attempt(() => {
    const slug = system ?? localStorage.getItem(LAST);
    const text = slug === null ? null : localStorage.getItem(`${PREFIX}${slug}`);
    const kept: unknown = text === null ? null : JSON.parse(text);
    return typeof kept === 'object' && kept !== null ? { ...emptyDraft, ...kept } : null;
  });
}
