import { createServer } from 'node:http';

/* The mails of the stand-in to look at, on this machine alone: plain text, links to press, no script. */

const ESCAPES = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escape = (text) => text.replace(/[&<>"']/g, (character) => ESCAPES[character]);
const linked = (text) => escape(text).replace(/https?:\/\/[^\s<>"']+/g, (url) => `<a href="${url}">${url}</a>`);

const STYLE =
  ':root{color-scheme:light dark}body{margin:0 auto;max-width:42rem;padding:1rem;font:1.125rem/1.6 Georgia,serif;' +
  'background:light-dark(#f2f4f1,#141817);color:light-dark(#1f2422,#e9eeeb)}a{color:light-dark(#1f4e7a,#97c2ec)}' +
  'pre{white-space:pre-wrap;overflow-wrap:anywhere;font:inherit}li{margin-block:.5rem}';

const HEADERS = {
  'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; form-action 'none'; frame-ancestors 'none'; base-uri 'none'",
  'x-content-type-options': 'nosniff',
  'referrer-policy': 'no-referrer',
  'cache-control': 'no-store',
};

const page = (title, body) =>
  `<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">` +
  `<title>${escape(title)}</title><style>${STYLE}</style></head><body><main><h1>${escape(title)}</h1>${body}</main></body></html>`;

function listPage(letters) {
  const items = letters.reverse().map(({ name, subject, envelope, date }) => {
    const to = envelope.to.map(escape).join(', ');
    return `<li><a href="/mail/${name}">${escape(subject) || 'No subject'}</a><br>to ${to}, ${escape(date)}</li>`;
  });
  const list = items.length === 0 ? '<p>No mail has come yet.</p>' : `<ul>${items.join('')}</ul>`;
  return page(
    'Mail that did not leave this machine',
    `<p>Footring hands its mail to this stand-in until FOOTRING_MAIL_URL is set.</p>${list}`,
  );
}

const letterPage = ({ subject, envelope, date, text }) =>
  page(
    subject || 'No subject',
    `<p>to ${envelope.to.map(escape).join(', ')}<br>${escape(date)}</p><pre>${linked(text)}</pre><p><a href="/">All mail</a></p>`,
  );

/** Which host names may be asked for: a page elsewhere that gives its own name our address is not answered. */
const isOurs = (host) => /^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/.test(host ?? '');

async function asData(box, query) {
  const asked = { to: query.get('to') ?? '', after: query.get('after') ?? '' };
  const waitMs = Math.min(Number(query.get('wait') ?? 0) || 0, 60_000);
  const until = Date.now() + waitMs;
  let letters = box.list(asked);
  while (letters.length === 0 && Date.now() < until) {
    await box.next(until - Date.now());
    letters = box.list(asked);
  }
  return letters;
}

async function answerTo(box, request) {
  if (!isOurs(request.headers.host)) return { status: 421, type: 'text/plain', body: 'This is not asked for by this name.' };
  const { pathname, searchParams } = new URL(request.url ?? '/', 'http://localhost');
  if (pathname === '/') return { status: 200, type: 'text/html', body: listPage(box.list()) };
  if (pathname === '/mails.json') return { status: 200, type: 'application/json', body: JSON.stringify(await asData(box, searchParams)) };
  const letter = pathname.startsWith('/mail/') ? box.read(pathname.slice(6)) : null;
  if (letter !== null) return { status: 200, type: 'text/html', body: letterPage(letter) };
  return { status: 404, type: 'text/plain', body: 'There is no such mail.' };
}

/** The server of these pages; not listening yet. */
export function letterPages(box) {
  return createServer((request, response) => {
    answerTo(box, request)
      .catch((error) => ({ status: 500, type: 'text/plain', body: String(error?.message) }))
      .then(({ status, type, body }) => {
        response.writeHead(status, { ...HEADERS, 'content-type': `${type}; charset=utf-8` });
        response.end(body);
      });
  });
}
