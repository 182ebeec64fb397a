/** Kinds of refusal of the public API. Each has a page in plain words at `/problems/{kind}`. */
export const PROBLEMS = {
  malformed: 400,
  'unknown-region': 404,
  'unknown-rule': 404,
  'too-large': 413,
  'not-json': 415,
  'not-understood': 422,
  'too-many': 429,
  broken: 500,
  unavailable: 503,
} as const;
export type ProblemKind = keyof typeof PROBLEMS;

export type Fault = { readonly pointer: string; readonly detail: string };

export type Problem = {
  readonly kind: ProblemKind;
  readonly title: string;
  readonly detail: string;
  readonly errors?: readonly Fault[];
  /** Seconds after which it is worth trying again. */
  readonly retryAfterS?: number;
};

/** JSON Pointer (RFC 6901) of a path. */
export function pointerTo(path: readonly PropertyKey[]): string {
  return path.map((step) => `/${String(step).replaceAll('~', '~0').replaceAll('/', '~1')}`).join('');
}

/** The refusal as `application/problem+json` (RFC 9457). */
export function problemResponse({ kind, title, detail, errors, retryAfterS }: Problem): Response {
  const status = PROBLEMS[kind];
  const body = { type: `/problems/${kind}`, title, status, detail, ...(errors === undefined ? {} : { errors }) };
  const headers = { 'content-type': 'application/problem+json', 'cache-control': 'no-store', 'access-control-allow-origin': '*' };
  const later = retryAfterS === undefined ? {} : { 'retry-after': String(retryAfterS) };
  return new Response(JSON.stringify(body), { status, headers: { ...headers, ...later } });
}
