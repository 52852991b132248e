/** What a person reads of a mail. */
export interface ReadableMail {
  from: string;
  to: string;
  subject: string;
  date: string;
  text: string;
}

/**
 * Read a message of one plain-text part, as this server sends them (RFC 5322 with RFC 2047 headers; body as 7bit,
 * quoted-printable or base64).
 */
export function readMail(raw: string): ReadableMail {
  const [head = '', ...rest] = raw.replaceAll('\r\n', '\n').split('\n\n');
  const headers = new Map<string, string>();
  for (const line of head.replaceAll(/\n[ \t]+/g, ' ').split('\n')) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  const header = (name: string): string => decodeWords(headers.get(name) ?? '');
  return {
    from: header('from'),
    to: header('to'),
    subject: header('subject'),
    date: header('date'),
    text: decodeBody(rest.join('\n\n'), headers.get('content-transfer-encoding') ?? '7bit'),
  };
}

function decodeBody(body: string, encoding: string): string {
  switch (encoding.toLowerCase()) {
    case 'base64':
      return Buffer.from(body, 'base64').toString('utf8');
    case 'quoted-printable':
      return decodeQuoted(body.replaceAll(/[ \t]+\n/g, '\n').replaceAll('=\n', ''));
    default:
      return body;
  }
}

const decodeQuoted = (text: string): string =>
  Buffer.from(
    text
      .replaceAll(/[^\u0000-\u00ff]/g, '?')
      .replaceAll(/=([0-9A-Fa-f]{2})/g, (_, hex: string) => String.fromCharCode(parseInt(hex, 16))),
    'latin1',
  ).toString('utf8');

/** Encoded words: `=?UTF-8?Q?…?=`. Blanks between two of them are not text. */
const decodeWords = (text: string): string =>
  text
    .replaceAll(/\?=\s+=\?/g, '?==?')
    .replaceAll(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_, kind: string, coded: string) =>
      kind.toLowerCase() === 'b'
        ? Buffer.from(coded, 'base64').toString('utf8')
        : decodeQuoted(coded.replaceAll('_', ' ')),
    );
