import 'server-only';
import { createHash } from 'node:crypto';
import { LARGEST_FILE, type FileFingerprint } from '@/lib/files/domain/kept-file';
import { err, ok, type Result } from '@/lib/kernel/result';
import { kindOf, type WrongKind } from './content-kind';
import { drawAnew, type BadImage, type ImageType } from './drawn-anew';
import type { Bytes } from './file-store';
import type { Incoming } from './incoming';

export type ReadyFile = FileFingerprint & { readonly stream: () => Bytes };
export type NotKept = WrongKind | BadImage;

/** The bytes that will be kept of what came: a picture drawn anew, anything else as it is. Nothing of it is unpacked or run. */
export async function readyToKeep(incoming: Incoming): Promise<Result<ReadyFile, NotKept>> {
  const kind = await kindOf(incoming);
  if (!kind.ok) return kind;
  const type = kind.value;
  if (type === 'image/jpeg' || type === 'image/png' || type === 'image/webp') return readyImage(incoming, type);
  const { bytes, sha256, stream } = incoming;
  return ok({ type, bytes, sha256, stream });
}

async function readyImage({ path }: Incoming, type: ImageType): Promise<Result<ReadyFile, NotKept>> {
  const drawn = await drawAnew(path, type);
  if (!drawn.ok) return drawn;
  const image = drawn.value;
  if (image.byteLength > LARGEST_FILE) return err({ kind: 'too-large' });
  return ok({ type, bytes: image.byteLength, sha256: createHash('sha256').update(image).digest('hex'), stream: () => [image] });
}
