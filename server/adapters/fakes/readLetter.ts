/**
 * Reads a mail message (RFC 5322 with the MIME parts of RFC 2045 to 2047) far enough to see what a person would read.
 * For the local fake only: it takes what our own mail adapter sends, and leaves attachments out.
 */

export type Letter = {
  /** When the fake received it, ISO 8601 in UTC. */
  receivedAt: string;
  from: string;
  to: string[];
  subject: string;
  text: string;
  html: string;
};

type Part = { headers: Map<string, string>; body: string };

/** The readable content of a raw message; `raw` holds one character a byte (latin1). */
export function readLetter(raw: string): Omit<Letter, 'receivedAt' | 'to'> {
  const message = splitPart(raw);
  const leaves = leavesOf(message);
  const body = (type: string) => leaves.find((leaf) => mediaType(leaf).startsWith(type));
  return {
    from: decodeWords(message.headers.get('from') ?? ''),
    subject: decodeWords(message.headers.get('subject') ?? ''),
    text: decodeBody(body('text/plain')),
    html: decodeBody(body('text/html')),
  };
}

function splitPart(raw: string): Part {
  const text = raw.replaceAll('\r\n', '\n');
  const end = text.indexOf('\n\n');
  const head = end < 0 ? text : text.slice(0, end);
  const headers = new Map<string, string>();
  // A header goes on over lines that begin with white space.
  for (const line of head.replaceAll(/\n[ \t]+/g, ' ').split('\n')) {
    const colon = line.indexOf(':');
    if (colon > 0) headers.set(line.slice(0, colon).toLowerCase(), line.slice(colon + 1).trim());
  }
  return { headers, body: end < 0 ? '' : text.slice(end + 2) };
}

function mediaType(part: Part): string {
  return (part.headers.get('content-type') ?? 'text/plain').toLowerCase();
}

function leavesOf(part: Part): Part[] {
  const boundary = /boundary="?([^";]+)"?/i.exec(part.headers.get('content-type') ?? '')?.[1];
  if (!mediaType(part).startsWith('multipart/') || boundary === undefined) return [part];
  const inner = part.body.split(`--${boundary}`).slice(1).filter((piece) => !piece.startsWith('--'));
  return inner.flatMap((piece) => leavesOf(splitPart(piece.replace(/^\n/, ''))));
}

function decodeBody(part: Part | undefined): string {
  if (part === undefined) return '';
  const encoding = (part.headers.get('content-transfer-encoding') ?? '').toLowerCase();
  const bytes =
    encoding === 'base64'
      ? Buffer.from(part.body, 'base64')
      : Buffer.from(encoding === 'quoted-printable' ? decodeQuoted(part.body.replaceAll(/=\n/g, '')) : part.body, 'latin1');
  return bytes.toString('utf8').trimEnd();
}

function decodeQuoted(text: string): string {
  return text.replaceAll(/=([0-9A-F]{2})/gi, (_, hex: string) => String.fromCharCode(Number.parseInt(hex, 16)));
}

/** RFC 2047: words such as `=?UTF-8?Q?caf=C3=A9?=`; white space between two of them is not part of the text. */
function decodeWords(header: string): string {
  const joined = header.replaceAll(/\?=\s+=\?/g, '?==?');
  return joined.replaceAll(/=\?utf-8\?([qb])\?([^?]*)\?=/gi, (_, how: string, text: string) =>
    how.toLowerCase() === 'b'
      ? Buffer.from(text, 'base64').toString('utf8')
      : Buffer.from(decodeQuoted(text.replaceAll('_', ' ')), 'latin1').toString('utf8'),
  );
}
