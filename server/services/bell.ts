/** Lets one wait for news that another rings in; news that comes while nobody waits is kept for the next who does. */
export class Bell {
  private rung = false;
  private wake: (() => void) | null = null;

  ring(): void {
    this.rung = true;
    this.wake?.();
  }

  /** Resolves with the next news, at once when there was some, after so many milliseconds, or when the signal says so. */
  async wait(ms: number, signal: AbortSignal): Promise<void> {
    if (!this.rung && !signal.aborted) await this.sleep(ms, signal);
    this.rung = false;
  }

  private sleep(ms: number, signal: AbortSignal): Promise<void> {
    return new Promise((resolve) => {
      const done = (): void => {
        clearTimeout(timer);
        signal.removeEventListener('abort', done);
        this.wake = null;
        resolve();
      };
      const timer = setTimeout(done, ms);
      signal.addEventListener('abort', done);
      this.wake = done;
    });
  }
}
