import { Logger, runOnce } from 'graphile-worker';
import { sendMail } from '@/server/jobs/send-mail';
import { MailFolder } from '@/server/mail/mail-folder';
import type { Mailer } from '@/server/mail/mailer';
import { readMail, type ReadableMail } from '@/server/mail/read-mail';
import type { TestApp } from './test-app';

const quiet = new Logger(() => () => undefined);

/** Let a worker send what waits in the queue. */
export async function sendWaitingMail(t: TestApp, mailer: Mailer): Promise<void> {
  await runOnce({
    connectionString: t.database.url,
    taskList: { 'send-mail': sendMail(mailer) },
    noHandleSignals: true,
    logger: quiet,
  });
}

/** Send what waits, through real SMTP into the sink, and read the newest mail to an address. */
export async function newestMail(t: TestApp, mailer: Mailer, to: string): Promise<ReadableMail | undefined> {
  await sendWaitingMail(t, mailer);
  return new MailFolder(t.dependencies.config.stateFolder)
    .list()
    .map(({ raw }) => readMail(raw))
    .find((mail) => mail.to === to);
}
