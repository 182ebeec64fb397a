import 'server-only';
import { open } from 'node:fs/promises';
import { fileTypeFromBuffer } from 'file-type';
import { FILE_TYPES, LARGEST_TEXT, type FileType } from '@/lib/files/domain/kept-file';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Incoming } from './incoming';

const HEAD = 4_100;
/** What a browser might read as a page, a drawing or a program if it guessed. */
const MARKUP = ['<!doctype', '<html', '<svg', '<?xml', '<script'];
const CONTROL = /(?![\t\n\f\r])\p{Cc}/u;

export type WrongKind = { readonly kind: 'wrong-type' } | { readonly kind: 'too-large' };

/** What a file is by its content. Its name and what the sender calls it are not asked. */
export async function kindOf(incoming: Incoming): Promise<Result<FileType, WrongKind>> {
  const found = await fileTypeFromBuffer(await headOf(incoming.path));
  const known = FILE_TYPES.find((type) => type === found?.mime);
  if (known !== undefined) return ok(known);
  return textKind(incoming);
}

async function headOf(path: string): Promise<Uint8Array> {
  const file = await open(path, 'r');
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(HEAD), 0, HEAD, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await file.close();
  }
}

/** Plain words in UTF-8 without control characters and without anything a browser would take for markup. */
async function textKind(incoming: Incoming): Promise<Result<FileType, WrongKind>> {
  const text = incoming.bytes <= LARGEST_TEXT ? textOf(await incoming.whole()) : null;
  if (text !== null) return isPlain(text) ? ok('text/plain') : err({ kind: 'wrong-type' });
  const begins = textOf(await headOf(incoming.path), true);
  return err({ kind: incoming.bytes > LARGEST_TEXT && begins !== null && isPlain(begins) ? 'too-large' : 'wrong-type' });
}

function textOf(bytes: Uint8Array, isCut = false): string | null {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream: isCut });
  } catch {
    return null;
  }
}

function isPlain(text: string): boolean {
  const small = text.toLowerCase();
  return !CONTROL.test(text) && MARKUP.every((mark) => !small.includes(mark));
}
