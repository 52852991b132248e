import { emptyDraft, type OrbitDraft } from '@/features/checking/orbit-draft';

/** Where the Desk keeps what was typed into a draft until the server has it, one form a submission. */
const PREFIX = 'ritornel-draft-';

/** Storage may be full or forbidden; then the typing lives as long as the page. */
function attempt<T>(work: () => T): T | null {
  try {
    return work();
  } catch {
    return null;
  }
}

/** Keep a form that the server does not have yet; null once it has it. */
export function keepDraft(id: string, draft: OrbitDraft | null): void {
  attempt(() => {
    if (draft === null) localStorage.removeItem(PREFIX + id);
    else localStorage.setItem(PREFIX + id, JSON.stringify(draft));
  });
}

/** The form that was left before the server had it; null when there is none. */
export const keptDraft = (id: string): OrbitDraft | null =>
  attempt(() => {
    const text = localStorage.getItem(PREFIX + id);
    const kept: unknown = text === null ? null : JSON.parse(text);
    return typeof kept === 'object' && kept !== null ? { ...emptyDraft, ...kept } : null;
  });
