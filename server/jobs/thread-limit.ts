const LONGEST_MESSAGE = 300;

/** What an error says, short enough to be stored. */
export const messageOf = (error: unknown): string =>
  (error instanceof Error ? error.message : String(error)).slice(0, LONGEST_MESSAGE);

/** Whether a thread was ended because it took too long or too much memory: an answer, not a crash. */
export function isThreadLimit(error: unknown): boolean {
  const { name, code } = (error ?? {}) as { name?: unknown; code?: unknown };
  return name === 'AbortError' || code === 'ERR_WORKER_OUT_OF_MEMORY';
}
