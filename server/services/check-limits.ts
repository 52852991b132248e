/** Who may compute how much. Each limit appears in the error that it causes. */

/** Checks that wait or run at once. */
export const CHECKS_AT_ONCE = 8;
export const CHECKS_AT_ONCE_WITHOUT_ACCOUNT = 2;
/** Computing time of one check. */
export const SECONDS_A_CHECK = 20;
export const SECONDS_A_CHECK_WITHOUT_ACCOUNT = 5;
/** Computing time in a window of time. */
export const COMPUTING = { seconds: 600, windowSeconds: 600 };
export const COMPUTING_WITHOUT_ACCOUNT = { seconds: 10, windowSeconds: 60 };

/** Order in the queue, smaller numbers first: what somebody waits for, what a curator waits for, visitors. */
export const PRIORITY = { check: 0, submission: 5, withoutAccount: 10 };

/** A crash of the machinery is tried again; after so many tries the check has failed. */
export const TRIES = 3;
