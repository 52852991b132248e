import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';
import type { MailFolder } from '@/server/mail/mail-folder';

/** Largest mail the sink takes. */
const MAX_MAIL_BYTES = 1_048_576;

export interface SmtpSink {
  url: string;
  close(): Promise<void>;
}

/** A real SMTP server on a free loopback port that keeps every mail and sends none on. */
export function startSmtpSink(folder: MailFolder): Promise<SmtpSink> {
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: MAX_MAIL_BYTES,
    logger: false,
    onData(stream, _session, done) {
      const chunks: Buffer[] = [];
      stream.on('data', (chunk: Buffer) => chunks.push(chunk));
      stream.on('end', () => {
        try {
          folder.keep(Buffer.concat(chunks));
          done();
        } catch (error) {
          done(error as Error);
        }
      });
    },
  });
  return new Promise((resolve, reject) => {
    server.on('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = server.server.address() as AddressInfo;
      resolve({
        url: `smtp://127.0.0.1:${port}`,
        close: () => new Promise((closed) => server.close(() => closed())),
      });
    });
  });
}
