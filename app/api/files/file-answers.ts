import { FILE_REFUSALS, type FileRefusalKind } from '@/lib/files/domain/file-refusal';
import { words } from '@/lib/kernel/words';
import { doorOf } from '@/lib/server/lead-on';
import { ownOrigin, samePlace } from '@/lib/server/own-site';

/** What nobody else may keep, and no browser may take for anything but what it is said to be. */
export const PRIVATE = { 'cache-control': 'private, no-store', 'x-content-type-options': 'nosniff' } as const;

const STORE_BACK_S = 60;

type Asked = {
  readonly request: Request;
  /** A path of this site to go back to, as the form said. */
  readonly back: string | undefined;
  /** The body is still on its way and nobody will read it. */
  readonly isUnread: boolean;
};

export type Refused = { readonly kind: FileRefusalKind; readonly retryAfterS?: number };

export const wantsJson = (request: Request): boolean => (request.headers.get('accept') ?? '').includes('application/json');

/** A page of ours, with what came of it in its address. */
export function backTo(back: string, told: Readonly<Record<string, string>>): string {
  const url = new URL(samePlace(new URL(back, ownOrigin()).href), ownOrigin());
  for (const name of ['file', 'refused', ...Object.keys(told)]) url.searchParams.delete(name);
  for (const [name, value] of Object.entries(told)) url.searchParams.set(name, value);
  return url.pathname + url.search;
}

/** Said as JSON to a script, as a redirect to a form's page, and in plain words to whoever came from nowhere. */
export function refuse(refused: Refused, asked: Asked): Response {
  const { kind } = refused;
  const headers = headersFor(refused, asked);
  if (wantsJson(asked.request)) return saidAsJson(kind, headers);
  const page = asked.back ?? asked.request.headers.get('referer');
  if (page === null || !isPlace(page) || kind === 'origin') return saidInWords(kind, headers);
  headers.set('location', placeFor(kind, page));
  return new Response(null, { status: 303, headers });
}

function headersFor({ kind, retryAfterS }: Refused, { isUnread }: Asked): Headers {
  const waitS = kind === 'store-down' ? STORE_BACK_S : retryAfterS;
  return new Headers({
    ...PRIVATE,
    ...(waitS === undefined ? {} : { 'retry-after': String(waitS) }),
    ...(isUnread ? { connection: 'close' } : {}),
  });
}

const isPlace = (page: string): boolean => URL.canParse(page, ownOrigin());

/** What somebody can do first and then come back; for all else the page they came from says why. */
function placeFor(kind: FileRefusalKind, page: string): string {
  const steps = ['sign-in', 'sign-in-again', 'second-factor-needed', 'confirm-first'] as const;
  const step = steps.find((one) => one === kind);
  const door = step === undefined ? null : doorOf(step, backTo(page, {}));
  return door ?? backTo(page, { refused: kind });
}

function saidAsJson(kind: FileRefusalKind, headers: Headers): Response {
  const status = FILE_REFUSALS[kind];
  headers.set('content-type', 'application/problem+json');
  const said = { type: 'about:blank', title: words('files.notKept'), status, detail: words(`files.refused.${kind}`), kind };
  return new Response(JSON.stringify(said), { status, headers });
}

/** One sentence, as plain text. */
export function saidInWords(kind: FileRefusalKind, headers: Headers = new Headers(PRIVATE)): Response {
  headers.set('content-type', 'text/plain; charset=utf-8');
  return new Response(`${words(`files.refused.${kind}`)}\n`, { status: FILE_REFUSALS[kind], headers });
}
