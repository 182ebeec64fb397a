/** Why a file was not kept or is not handed out, and the status that says so. The words are in `files.refused`. */
export const FILE_REFUSALS = {
  origin: 403,
  'no-length': 411,
  'not-a-form': 415,
  malformed: 400,
  empty: 422,
  'too-large': 413,
  'wrong-type': 415,
  'too-many-pixels': 413,
  unreadable: 415,
  quota: 429,
  'too-many': 429,
  'store-full': 507,
  'store-down': 503,
  busy: 409,
  'key-reused': 409,
  'sign-in': 401,
  'not-allowed': 403,
  'confirm-first': 403,
  'second-factor-needed': 403,
  'sign-in-again': 403,
  'not-found': 404,
  'link-over': 403,
  'link-changed': 403,
} as const;
export type FileRefusalKind = keyof typeof FILE_REFUSALS;

/** The kind that a page's address names (`?refused=`), or null for anything else. */
export function fileRefusalIn(text: string | null | undefined): FileRefusalKind | null {
  return isKind(text) ? text : null;
}

const isKind = (text: string | null | undefined): text is FileRefusalKind => typeof text === 'string' && Object.hasOwn(FILE_REFUSALS, text);
