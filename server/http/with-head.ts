import { escapeHtml } from '@/server/http/escape-html';
import type { PageHead } from '@/server/presenters/head/page-head';

/** Put title, description, address and linked data of one page into the client's document. */
export function withHead(document: string, { title, description, canonical, linkedData }: PageHead): string {
  const extra = [
    `<link rel="canonical" href="${escapeHtml(canonical)}" />`,
    `<meta property="og:title" content="${escapeHtml(title)}" />`,
    `<meta property="og:description" content="${escapeHtml(description)}" />`,
    // Inside a script nothing is unescaped: only "<" could end it.
    `<script type="application/ld+json">${JSON.stringify(linkedData).replaceAll('<', '\\u003c')}</script>`,
  ];
  return document
    .replace(/<title>[^<]*<\/title>/, () => `<title>${escapeHtml(title)}</title>`)
    .replace(/(<meta\s+name="description"\s+content=")[^"]*(")/, (_, before: string, after: string) => {
      return `${before}${escapeHtml(description)}${after}`;
    })
    .replace('</head>', () => `${extra.join('\n')}\n</head>`);
}
