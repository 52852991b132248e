/** Digits that every accepted entry is refined to by itself. */
export const DIGITS_OF_EVERY_ENTRY = 30;

/** Computing time of one refinement; it appears in the message that it causes. */
export const SECONDS_A_REFINEMENT = 60;

/** Order in the queue, behind every check: what somebody asked for, then what the archive does by itself. */
export const REFINEMENT_PRIORITY = { asked: 20, background: 30 };
