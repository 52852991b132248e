/** A journey through the whole product starts a server and a browser: minutes on a busy machine. */
const JOURNEY_TIMEOUT_MS = 600_000;

jest.setTimeout(JOURNEY_TIMEOUT_MS);
