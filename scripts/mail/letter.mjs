/* Reads a mail as far as the stand-in shows it: who, what about, and its parts as text. */

/** A mail out of its source. Header names are in lower case; one that comes twice is a list of lines. */
export function readLetter(source) {
  const { headers, body } = split(source.replaceAll('\r\n', '\n'));
  const parts = partsOf(headers, body);
  return {
    headers: Object.fromEntries(headers),
    to: valueOf(headers, 'to'),
    subject: decodeWords(valueOf(headers, 'subject')),
    date: valueOf(headers, 'date'),
    text: parts.find(({ type }) => type === 'text/plain')?.text ?? '',
    html: parts.find(({ type }) => type === 'text/html')?.text ?? '',
  };
}

function split(text) {
  const end = text.indexOf('\n\n');
  const head = end === -1 ? text : text.slice(0, end);
  const headers = new Map();
  for (const line of head.replace(/\n[ \t]+/g, ' ').split('\n')) {
    const colon = line.indexOf(':');
    if (colon < 1) continue;
    const name = line.slice(0, colon).toLowerCase();
    headers.set(name, [...(headers.get(name) ?? []), line.slice(colon + 1).trim()]);
  }
  return { headers, body: end === -1 ? '' : text.slice(end + 2) };
}

const valueOf = (headers, name) => headers.get(name)?.[0] ?? '';

function partsOf(headers, body, depth = 0) {
  const said = valueOf(headers, 'content-type') || 'text/plain';
  const type = said.split(';')[0].trim().toLowerCase();
  const boundary = /boundary="?([^";]+)"?/i.exec(said)?.[1];
  if (type.startsWith('multipart/') && boundary !== undefined && depth < 5) {
    const pieces = `\n${body}`.split(`\n--${boundary}`).slice(1, -1);
    return pieces.flatMap((piece) => {
      const part = split(piece.replace(/^[ \t]*\n/, ''));
      return partsOf(part.headers, part.body, depth + 1);
    });
  }
  return [{ type, text: decodeBody(valueOf(headers, 'content-transfer-encoding').toLowerCase(), body) }];
}

function decodeBody(encoding, body) {
  if (encoding === 'base64') return Buffer.from(body, 'base64').toString('utf8');
  if (encoding === 'quoted-printable') return decodeQuoted(body.replace(/=[ \t]*\n/g, ''));
  return Buffer.from(body, 'latin1').toString('utf8');
}

function decodeQuoted(text) {
  const bytes = text.replace(/=([0-9A-Fa-f]{2})/g, (_, hex) => String.fromCharCode(parseInt(hex, 16)));
  return Buffer.from(bytes, 'latin1').toString('utf8');
}

/** `=?UTF-8?Q?caf=C3=A9?=` as it is read. */
function decodeWords(text) {
  return text
    .replace(/\?=\s+=\?/g, '?==?')
    .replace(/=\?utf-8\?([bq])\?([^?]*)\?=/gi, (_, how, coded) =>
      how.toLowerCase() === 'b' ? Buffer.from(coded, 'base64').toString('utf8') : decodeQuoted(coded.replaceAll('_', ' ')),
    );
}
