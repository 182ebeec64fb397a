/** What a form holds, by field, as the server reads it. */
export type Values = Readonly<Record<string, string | readonly string[]>>;

/** What stands on the server by now; null where it was saved or thrown away meanwhile. */
export type Standing = { readonly version: number; readonly values: Values | null };
export type Answer =
  | { readonly kind: 'kept'; readonly version: number }
  | { readonly kind: 'moved'; readonly standing: Standing }
  | { readonly kind: 'signed-out' }
  | { readonly kind: 'failed' };

/** Fields of the form itself, not of the item. */
const OWN = new Set(['key', 'id', 'item', 'version', 'do']);

/** The fields of the item in a form. */
export function valuesOf(form: HTMLFormElement): Values {
  const data = new FormData(form);
  const names = [...new Set(data.keys())].filter((name) => !OWN.has(name) && !name.startsWith('$ACTION'));
  return Object.fromEntries(names.map((name) => [name, valueOf(data, name)]));
}

function valueOf(data: FormData, name: string): string | readonly string[] {
  const given = data.getAll(name).flatMap((value) => (typeof value === 'string' ? [value] : []));
  const [first = ''] = given;
  return given.length > 1 ? given : first;
}

/** Whether two forms say the same; what is empty is as good as not there. */
export function sameValues(a: Values, b: Values): boolean {
  const text = (value: Values[string] | undefined): string => [value ?? ''].flat().map(withPlainEnds).join('\u0000');
  return [...new Set([...Object.keys(a), ...Object.keys(b)])].every((name) => text(a[name]) === text(b[name]));
}

const withPlainEnds = (text: string): string => text.replaceAll('\r\n', '\n');

type Sent = { readonly id: string; readonly item: string; readonly version: number; readonly values: Values };

/** Sends what was typed. Without an answer it counts as failed, and is sent again. */
export const sendEntry = (entry: Sent): Promise<Answer> =>
  fetch('/api/entries', {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(entry),
    keepalive: true,
  }).then(read, (): Answer => ({ kind: 'failed' }));

async function read(answer: Response): Promise<Answer> {
  if (answer.status === 401) return { kind: 'signed-out' };
  if (!answer.ok && answer.status !== 409) return { kind: 'failed' };
  const body: unknown = await answer.json();
  if (!isStanding(body)) return { kind: 'failed' };
  return answer.ok ? { kind: 'kept', version: body.version } : { kind: 'moved', standing: body };
}

const isStanding = (body: unknown): body is Standing =>
  typeof body === 'object' &&
  body !== null &&
  'version' in body &&
  typeof body.version === 'number' &&
  (!('values' in body) || isValues(body.values));

/** What the device or the server gave back as the fields of a form. */
export const isValues = (values: unknown): values is Values | null =>
  values === null ||
  (typeof values === 'object' &&
    Object.values(values).every(
      (value) => typeof value === 'string' || (Array.isArray(value) && value.every((one) => typeof one === 'string')),
    ));
