import type { Task } from 'graphile-worker';
import type { Desk } from '@/server/services/desk';
import { sendDigests } from '@/server/services/send-digests';

/** The job that mails every curator what is new in the queue. */
export function sendDigestsJob(desk: Desk): Task {
  return async () => {
    await sendDigests(desk);
  };
}
