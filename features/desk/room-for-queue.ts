/** With less room than this a review would be narrower beside the queue than on a phone, px. */
export const ROOM_FOR_QUEUE = 1240;
