import { createTransport, type Transporter } from 'nodemailer';
import type { Config } from '@/server/config';
import { MailFolder } from '@/server/mail/mail-folder';
import { startSmtpSink, type SmtpSink } from '@/server/mail/smtp-sink';

/** A mail server that does not answer within this time has failed; the job tries again later. */
const SMTP_TIMEOUT_MS = 20_000;

export interface Mail {
  to: string;
  subject: string;
  text: string;
}

/** Hands mails to an SMTP server: the configured one, or a sink of this process's own. */
export interface Mailer {
  /** @throws when the mail server does not take the mail. */
  send(mail: Mail): Promise<void>;
  close(): Promise<void>;
}

/** A mailer that connects when the first mail is sent. */
export function createMailer(config: Pick<Config, 'smtpUrl' | 'mailFrom' | 'stateFolder'>): Mailer {
  let sink: SmtpSink | null = null;
  let transport: Promise<Transporter> | null = null;

  const connect = async (): Promise<Transporter> => {
    if (config.smtpUrl === null) sink = await startSmtpSink(new MailFolder(config.stateFolder));
    const { protocol, hostname, port, username, password } = new URL(config.smtpUrl ?? sink!.url);
    return createTransport({
      host: hostname,
      ...(port ? { port: parseInt(port, 10) } : {}),
      secure: protocol === 'smtps:',
      ignoreTLS: sink !== null,
      ...(username ? { auth: { user: decodeURIComponent(username), pass: decodeURIComponent(password) } } : {}),
      connectionTimeout: SMTP_TIMEOUT_MS,
      greetingTimeout: SMTP_TIMEOUT_MS,
      socketTimeout: SMTP_TIMEOUT_MS,
    });
  };

  return {
    async send({ to, subject, text }) {
      transport ??= connect();
      // One recipient as a plain address: a comma in it must not make two.
      await (await transport).sendMail({ from: config.mailFrom, to: { name: '', address: to }, subject, text });
    },
    async close() {
      (await transport)?.close();
      await sink?.close();
    },
  };
}
