import { ServerResponse } from 'node:http';
import broken from '@/content/messages/en/broken.json';

/** How Next begins a page whose drawing threw or was not found: an empty document that only a script fills. */
const SHELL = '<html id="__next_error__">';
const LARGEST_PIECE = 65_536;

const STYLE =
  ':root{color-scheme:light dark}body{margin:0 auto;max-width:42rem;padding:2rem 1rem;font:1.125rem/1.6 Georgia,serif;' +
  'background:light-dark(#f2f4f1,#141817);color:light-dark(#1f2422,#e9eeeb)}a{color:light-dark(#1f4e7a,#97c2ec)}';

const link = (address: string, said: string): string => `<a href="${address}">${said}</a>`;

type Said = { readonly title: string; readonly titleOf: string; readonly lead: string };

function wordsOf(status: number): Said {
  if (status === 404 || status === 410) return broken.gone;
  return status === 503 ? broken.away : broken;
}

/** The number under which the fault is in the log, as it lies in the data for the script, a piece of the answer further on. */
const NUMBER = /\{\\"digest\\":\\"([\w-]+)\\"\}/;

function words(status: number): string {
  const said = wordsOf(status);
  const ways = [link('/', broken.home), link('/regions', broken.regions), link('/contact', broken.help)];
  const items = ways.map((way) => `<li>${way}</li>`).join('');
  return `<style>${STYLE}</style><main><h1>${said.title}</h1><p>${said.lead}</p><ul>${items}</ul></main>`;
}

const textOf = (chunk: unknown): string | null =>
  chunk instanceof Uint8Array && chunk.length < LARGEST_PIECE
    ? Buffer.from(chunk.buffer, chunk.byteOffset, chunk.byteLength).toString('utf8')
    : null;

/** The shell with words in it for whoever runs no script. Null for any other piece of an answer. */
export function withWords(chunk: unknown, status: number): Buffer | null {
  const html = status < 400 ? null : textOf(chunk);
  if (html === null || !html.includes(SHELL)) return null;
  const title = wordsOf(status).titleOf;
  const named = html.replace(/<title>[^<]*<\/title>/, '').replace('</head>', `<title>${title}</title></head>`);
  return Buffer.from(
    named.replace(SHELL, '<html id="__next_error__" lang="en">').replace('<body>', `<body><noscript>${words(status)}</noscript>`),
  );
}

/** A later piece of such a page with the fault's number behind it. Null when it holds none, or ends inside of something. */
export function withNumber(chunk: unknown): Buffer | null {
  const html = textOf(chunk);
  const number = html === null ? undefined : NUMBER.exec(html)?.[1];
  if (html === null || number === undefined || !html.endsWith('</script>')) return null;
  return Buffer.from(`${html}<noscript><p>${broken.mend}</p><p>${number}</p></noscript>`);
}

type Write = (this: ServerResponse, chunk: unknown, ...rest: unknown[]) => unknown;
const isWrite = (value: unknown): value is Write => typeof value === 'function';

const shells = new WeakSet<ServerResponse>();

function said(response: ServerResponse, chunk: unknown): unknown {
  if (shells.has(response)) return withNumber(chunk) ?? chunk;
  const page = withWords(chunk, response.statusCode);
  if (page !== null) shells.add(response);
  return page ?? chunk;
}

const saying = (write: Write): Write =>
  function (chunk, ...rest) {
    return write.call(this, said(this, chunk), ...rest);
  };

/**
 * Leans on an inside of Next (the shell above), guarded by a test without script on a thrown and on a not-found page.
 * The setter keeps this outside of Next's compression, which puts its own `write` on each response.
 */
export function sayErrorPages(): void {
  const original: unknown = Reflect.get(ServerResponse.prototype, 'write');
  if (!isWrite(original)) return;
  const own = new WeakMap<ServerResponse, Write>();
  const plain = saying(original);
  Object.defineProperty(ServerResponse.prototype, 'write', {
    configurable: true,
    get(this: ServerResponse) {
      return own.get(this) ?? plain;
    },
    set(this: ServerResponse, next: unknown) {
      if (isWrite(next)) own.set(this, saying(next));
    },
  });
}
