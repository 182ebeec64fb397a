import { request, type OutgoingHttpHeaders } from 'node:http';
import { SITE } from './browser';

export type Answer = { readonly status: number; readonly headers: Readonly<Record<string, unknown>>; readonly text: string };

/** Names and values in turn, sent as they stand, or by name. */
export type Sent = readonly string[] | OutgoingHttpHeaders;

/** One request just as it is written: `fetch` would tidy up its path and refuse some of its headers. */
export function send(
  site: string,
  path: string,
  headers: Sent,
  body?: Buffer,
  method = body === undefined ? 'GET' : 'POST',
): Promise<Answer> {
  const { hostname, port } = new URL(site);
  return new Promise((resolve, reject) => {
    const asked = request({ hostname, port, path, method, headers: headers as OutgoingHttpHeaders }, (answer) => {
      const parts: Buffer[] = [];
      answer.on('data', (part: Buffer) => parts.push(part));
      answer.on('error', reject);
      answer.on('end', () => {
        resolve({ status: answer.statusCode ?? 0, headers: answer.headers, text: Buffer.concat(parts).toString('utf8') });
      });
    });
    asked.on('error', reject);
    asked.end(body);
  });
}

export type Fields = readonly (readonly [name: string, value: string])[];

const readable = (text: string): string =>
  text.replaceAll('&quot;', '"').replaceAll('&#x27;', "'").replaceAll('&lt;', '<').replaceAll('&gt;', '>').replaceAll('&amp;', '&');

/** The fields that the forms of a page's main part send along unseen. */
export async function hiddenFields(site: string, path: string, headers: Sent = {}): Promise<Fields> {
  const { text } = await send(site, path, headers);
  const main = text.slice(text.indexOf('<main'), text.indexOf('</main'));
  return [...main.matchAll(/<input type="hidden" name="([^"]+)"(?: value="([^"]*)")?/g)].map(([, name = '', value = '']) => [
    name,
    readable(value),
  ]);
}

/** A form as a browser without script packs it. */
export async function packed(fields: Fields): Promise<{ readonly type: string; readonly body: Buffer }> {
  const form = new FormData();
  for (const [name, value] of fields) form.append(name, value);
  const whole = new Response(form);
  return { type: whole.headers.get('content-type') ?? '', body: Buffer.from(await whole.arrayBuffer()) };
}

/** Posts a form of that page, from our own pages as it seems, with a key of its own. */
export async function post(
  site: string,
  path: string,
  hidden: Fields,
  fields: Readonly<Record<string, string>>,
  headers: OutgoingHttpHeaders = {},
): Promise<Answer> {
  const given = { key: crypto.randomUUID(), ...fields };
  const kept = hidden.filter(([name]) => !Object.hasOwn(given, name));
  const { type, body } = await packed([...kept, ...Object.entries(given)]);
  const whole = { host: new URL(SITE).host, origin: SITE, 'content-type': type, 'content-length': body.length, ...headers };
  return send(site, path, whole, body);
}

/** The session's cookie as an answer sets it: `name=value`. */
export function cookieIn({ headers }: Answer): string {
  const set = headers['set-cookie'];
  const found = Array.isArray(set) ? set.map(String).find((line) => line.startsWith('footring=')) : undefined;
  return (found ?? '').split(';')[0] ?? '';
}
