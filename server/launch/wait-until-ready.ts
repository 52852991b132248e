const PAUSE_MS = 500;
const REPORT_EVERY_MS = 15_000;
const REQUEST_TIMEOUT_MS = 10_000;

/**
 * Wait until the server says that everything is in place; tell now and then what it still waits for.
 *
 * @param signal  Ends the waiting, when something broke or a person gave up.
 */
export async function waitUntilReady(url: string, say: (line: string) => void, signal: AbortSignal): Promise<void> {
  let lastReport = Date.now();
  while (!signal.aborted) {
    const state = await readiness(`${url}/readyz`);
    if (state.ready) return;
    if (Date.now() - lastReport > REPORT_EVERY_MS) {
      say(`Still getting ready${state.waitingFor ? `: ${state.waitingFor}` : ''}`);
      lastReport = Date.now();
    }
    await new Promise((resolve) => setTimeout(resolve, PAUSE_MS));
  }
}

async function readiness(url: string): Promise<{ ready: boolean; waitingFor: string }> {
  try {
    const answer = await fetch(url, { signal: AbortSignal.timeout(REQUEST_TIMEOUT_MS) });
    const body = (await answer.json()) as { detail?: string };
    return { ready: answer.status === 200, waitingFor: body.detail ?? '' };
  } catch {
    return { ready: false, waitingFor: 'the web server does not answer yet' };
  }
}
