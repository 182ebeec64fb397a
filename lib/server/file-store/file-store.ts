import 'server-only';
import { randomBytes } from 'node:crypto';

export type Bytes = AsyncIterable<Uint8Array> | Iterable<Uint8Array>;
export type ObjectKind = { readonly type: string; readonly bytes: number };

/** Where uploads lie, as whole objects under random keys. Whatever fails throws a `StoreFault`. */
export type FileStore = {
  /** Puts an object of exactly so many bytes. It is there whole, or not at all. */
  readonly put: (key: string, body: Bytes, kind: ObjectKind) => Promise<void>;
  /** The object's bytes, or null when there is none. */
  readonly read: (key: string) => Promise<ReadableStream<Uint8Array> | null>;
  /** Takes an object away; one that is not there is no fault. */
  readonly remove: (key: string) => Promise<void>;
  /** Whether objects can be put and read at this moment. */
  readonly check: () => Promise<boolean>;
};

const KEY = /^[0-9a-f]{32}$/;

/** 128 random bits, 32 hexadecimal digits. */
export const newStoreKey = (): string => randomBytes(16).toString('hex');

/** The key itself, if it is one: nothing a person typed becomes part of a path. */
export function mustBeKey(key: string): string {
  if (!KEY.test(key)) throw new Error('That is no key of a stored object.');
  return key;
}
