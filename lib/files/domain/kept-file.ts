import { rankOf, type AccountId, type SignedIn } from '@/lib/access/domain/actor';

/** UUIDv7 of a kept file, made on our side. */
export type FileId = string & { readonly __brand: 'FileId' };

/** What is kept, by its content. Nothing a browser would run stands in this list. */
export const FILE_TYPES = ['application/pdf', 'image/png', 'image/jpeg', 'image/webp', 'text/plain'] as const;
export type FileType = (typeof FILE_TYPES)[number];

/** `coming`: its object may or may not be there yet. `gone`: its object is being removed, the row goes after it. */
export type FileState = 'coming' | 'ready' | 'gone';

/** `page-seen`: a copy of a page that an amendment's source was read in. */
export type FilePurpose = 'page-seen';

export type KeptFile = {
  readonly id: FileId;
  /** 32 hexadecimal digits at random: where its object lies. */
  readonly storeKey: string;
  /** Of the bytes that are kept: of an image, those it was drawn anew with. */
  readonly sha256: string;
  readonly type: FileType;
  readonly bytes: number;
  /** As its owner named it, tidied; for people to read and for nothing else. */
  readonly name: string;
  /** Null when its owner was forgotten. */
  readonly ownerId: AccountId | null;
  readonly purpose: FilePurpose;
  readonly state: FileState;
  readonly madeAt: Date;
};

/** What names a file's content in a sheet. */
export type FileFingerprint = Pick<KeptFile, 'sha256' | 'type' | 'bytes'>;

const MB = 1024 * 1024;
export const LARGEST_FILE = 15 * MB;
export const LARGEST_TEXT = MB;
export const MOST_PIXELS = 25_000_000;
/** What one person may send within 24 hours. */
export const DAY_BYTES = 100 * MB;
export const DAY_FILES = 60;
/** How long a signed link may be of use, in milliseconds. */
export const LINK_MS = 600_000;

export type Sent = { readonly files: number; readonly bytes: number };

/** Whether one more file of so many bytes is more than a day's worth. */
export const isTooMuch = (had: Sent, more: number): boolean => had.files >= DAY_FILES || had.bytes + more > DAY_BYTES;

/** Images are drawn anew before they are kept, so that they may be shown in a page; nothing else may. */
export const isImage = (type: FileType): boolean => type.startsWith('image/');

/**
 * FILE-6 Whether somebody who may read files at all may read this one: one's own always, moderators any, and editors what an edition
 * in use cites. For all others it is as if it were not there.
 */
export function mayReadFile(who: SignedIn, { ownerId }: Pick<KeptFile, 'ownerId'>, isCited: boolean): boolean {
  if (ownerId === who.id || rankOf(who.role) >= rankOf('moderator')) return true;
  return who.role === 'editor' && isCited;
}
