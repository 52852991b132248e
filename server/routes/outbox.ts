import { randomBytes, timingSafeEqual } from 'node:crypto';
import { type RequestHandler, Router } from 'express';
import type { AppDependencies } from '@/server/app-dependencies';
import { notFound } from '@/server/errors';
import { escapeHtml } from '@/server/http/escape-html';
import { keptSecret } from '@/server/kept-secret';
import { MailFolder } from '@/server/mail/mail-folder';
import { readMail, type ReadableMail } from '@/server/mail/read-mail';

const KEY_BYTES = 18;

/** The key that opens `/outbox`, made on first use and kept in the state folder. */
export const outboxKey = (stateFolder: string): string =>
  keptSecret(stateFolder, 'outbox-key', () => randomBytes(KEY_BYTES).toString('base64url'));

/** Mails that the local sink kept, for whoever holds the key. Not mounted in production. */
export function outboxRoutes({ config }: AppDependencies): Router {
  const router = Router();
  const folder = new MailFolder(config.stateFolder);
  const mails = (): (ReadableMail & { id: string })[] => folder.list().map(({ id, raw }) => ({ id, ...readMail(raw) }));
  const hasKey = requireKey(config.stateFolder);

  router.get('/outbox', hasKey, (_req, res) => {
    res.set('Cache-Control', 'no-store').type('html').send(outboxPage(mails()));
  });
  router.get('/outbox.json', hasKey, (_req, res) => {
    res.set('Cache-Control', 'no-store').json({ items: mails() });
  });
  return router;
}

function requireKey(stateFolder: string): RequestHandler {
  return (req, _res, next) => {
    const { key } = req.query;
    const given = Buffer.from(typeof key === 'string' ? key : '');
    const right = Buffer.from(outboxKey(stateFolder));
    if (given.length !== right.length || !timingSafeEqual(given, right)) throw notFound('page');
    next();
  };
}

function outboxPage(mails: readonly ReadableMail[]): string {
  const items = mails.map(
    (mail) => `<article>
<h2>${escapeHtml(mail.subject)}</h2>
<p>To ${escapeHtml(mail.to)}, from ${escapeHtml(mail.from)}, ${escapeHtml(mail.date)}</p>
<pre>${linked(escapeHtml(mail.text))}</pre>
</article>`,
  );
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta name="color-scheme" content="light dark">
<title>Outbox</title>
<style>
body { font: 1rem/1.5 system-ui, sans-serif; max-width: 48rem; margin: 2rem auto; padding: 0 1rem; }
article { border-top: 1px solid; padding: 1rem 0; }
h2 { margin: 0; font-size: 1.125rem; }
pre { white-space: pre-wrap; overflow-wrap: anywhere; }
</style>
</head>
<body>
<main>
<h1>Outbox</h1>
<p>Mails that this server sent while no mail server is configured, the newest first. They went nowhere else.</p>
${items.join('\n') || '<p>No mail has been sent yet.</p>'}
</main>
</body>
</html>
`;
}

/** Addresses as links; the text is escaped already. */
const linked = (html: string): string =>
  html.replaceAll(/https?:\/\/[^\s<]+/g, (address) => `<a href="${address}">${address}</a>`);
