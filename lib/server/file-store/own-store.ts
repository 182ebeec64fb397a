import 'server-only';
import { setTimeout as wait } from 'node:timers/promises';
import { readEnv } from '../env';
import { diskStore } from './disk-store';
import type { FileStore } from './file-store';
import { s3Store } from './s3-store';
import { StoreFault } from './store-fault';

/** So that a person hears within ten seconds, also of a disk that hangs. */
const PATIENCE_MS = 9_000;
const CHECK_MS = 3_000;
/** Health is asked by anybody, as often as they like: the store itself is asked at most once in this time. */
const CHECKED_MS = 5_000;

let own: FileStore | undefined;

/** The store the settings name: a folder, or a bucket. */
export function fileStore(): FileStore {
  const { s3, storeDir } = readEnv();
  own ??= patient(s3 === null ? diskStore(storeDir) : s3Store(s3));
  return own;
}

/** The same store, but one that says it is down instead of keeping anybody waiting. */
export function patient(store: FileStore, patienceMs = PATIENCE_MS): FileStore {
  return {
    put: (key, body, kind) => within(patienceMs, store.put(key, body, kind)),
    read: (key) => within(patienceMs, store.read(key)),
    remove: (key) => within(patienceMs, store.remove(key)),
    check: () => within(Math.min(CHECK_MS, patienceMs), store.check()),
  };
}

async function within<T>(ms: number, work: Promise<T>): Promise<T> {
  const over = new AbortController();
  const late = async (): Promise<never> => {
    await wait(ms, undefined, { signal: over.signal });
    throw new StoreFault('store-down', { cause: new Error(`No answer in ${ms} ms`) });
  };
  work.catch(() => undefined); // when it fails after we have stopped listening
  try {
    return await Promise.race([work, late()]);
  } finally {
    over.abort();
  }
}

let last: { readonly at: number; readonly well: Promise<boolean> } | undefined;

/** Whether the store is well, as it was some seconds ago at most. */
export function isStoreWell(): Promise<boolean> {
  if (last === undefined || Date.now() - last.at > CHECKED_MS) last = { at: Date.now(), well: isWell(fileStore()) };
  return last.well;
}

async function isWell(store: FileStore): Promise<boolean> {
  try {
    return await store.check();
  } catch (error) {
    if (error instanceof StoreFault) return false;
    throw error;
  }
}
