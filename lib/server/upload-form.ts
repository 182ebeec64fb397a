import 'server-only';
import { err, ok, type Result } from '@/lib/kernel/result';
import { BadForm, boundaryOf, readParts, textOfPart } from './multipart';
import { ownOrigin } from './own-site';

/** The form around a file: its fields, and the lines between them. */
const AROUND = 64 * 1024;
const LONGEST_FIELD = 4 * 1024;

export type UploadRefusal =
  | { readonly kind: 'origin' }
  | { readonly kind: 'no-length' }
  | { readonly kind: 'not-a-form' }
  | { readonly kind: 'too-large' }
  | { readonly kind: 'malformed' };

export type Fields = Readonly<Record<string, string>>;
export type SentFile = { readonly name: string; readonly body: AsyncIterable<Uint8Array>; readonly declaredBytes: number };
/** `fields`: those that stood before the file, also when it was refused. `isRead`: nothing of the body is on its way any more. */
export type Upload<T, E> = { readonly result: Result<T, E | UploadRefusal>; readonly fields: Fields; readonly isRead: boolean };

type Admitted = { readonly boundary: string; readonly length: number };

/**
 * Asks of the head alone: sent by a page of ours, with a length, and not longer than a file may be. `Sec-Fetch-Site` is missing from
 * old browsers; where it is there it has to agree.
 */
function admit(asked: Headers, most: number): Result<Admitted, UploadRefusal> {
  const site = asked.get('sec-fetch-site');
  if (asked.get('origin') !== ownOrigin() || (site !== null && site !== 'same-origin')) return err({ kind: 'origin' });
  const boundary = boundaryOf(asked.get('content-type'));
  if (boundary === null) return err({ kind: 'not-a-form' });
  const length = lengthIn(asked);
  if (length === null) return err({ kind: 'no-length' });
  return length > most + AROUND ? err({ kind: 'too-large' }) : ok({ boundary, length });
}

/** The length a request says it has; null when it says none, or comes in pieces whose number nobody knows. */
export function lengthIn(asked: Headers): number | null {
  const said = asked.get('content-length') ?? '';
  return asked.has('transfer-encoding') || !/^\d{1,15}$/.test(said) ? null : Number(said);
}

/**
 * Reads a form with one file as it streams in: fields first, then the file, which `work` reads as far as it likes. Of the whole, no
 * more than `most` bytes and the form around them is ever read.
 */
export async function takeUpload<T, E>(
  request: Request,
  most: number,
  work: (file: SentFile, fields: Fields) => Promise<Result<T, E>>,
): Promise<Upload<T, E>> {
  const admitted = admit(request.headers, most);
  if (!admitted.ok || request.body === null) {
    return { result: admitted.ok ? err({ kind: 'malformed' }) : admitted, fields: {}, isRead: false };
  }
  const pieces = piecesOf(request.body);
  const fields = new Map<string, string>();
  try {
    const result = await readForm(pieces, admitted.value, { fields, work });
    return { result, fields: Object.fromEntries(fields), isRead: true };
  } finally {
    await pieces.drain();
  }
}

type Reading<T, E> = {
  readonly fields: Map<string, string>;
  readonly work: (file: SentFile, fields: Fields) => Promise<Result<T, E>>;
};

async function readForm<T, E>(
  pieces: AsyncIterator<Uint8Array>,
  { boundary, length }: Admitted,
  { fields, work }: Reading<T, E>,
): Promise<Result<T, E | UploadRefusal>> {
  try {
    for await (const part of readParts(pieces, boundary)) {
      if (part.fileName === null) fields.set(part.name, await textOfPart(part, LONGEST_FIELD));
      else {
        const declaredBytes = Math.max(0, length - AROUND);
        return await work({ name: part.fileName, body: part.body, declaredBytes }, Object.fromEntries(fields));
      }
    }
  } catch (error) {
    if (!(error instanceof BadForm)) throw error;
  }
  return err({ kind: 'malformed' });
}

type Pieces = AsyncIterator<Uint8Array> & { readonly drain: () => Promise<void> };

/**
 * The body piece by piece, only as asked for. It is never cancelled: that would cut the line on which the answer goes out. What is left
 * of it is passed over instead, so that a browser that still sends gets to read why the file was refused.
 */
function piecesOf(body: ReadableStream<Uint8Array>): Pieces {
  const reader = body.getReader();
  const next = async (): Promise<IteratorResult<Uint8Array, undefined>> => {
    try {
      const { done, value } = await reader.read();
      return done ? { done: true, value: undefined } : { done: false, value };
    } catch (error) {
      throw new BadForm('The sender went away', { cause: error });
    }
  };
  const drain = async (): Promise<void> => {
    try {
      while ((await next()).done !== true);
    } catch (error) {
      if (!(error instanceof BadForm)) throw error; // nobody is there to read the answer
    }
  };
  return { next, drain };
}
