import 'server-only';
import { randomUUID } from 'node:crypto';
import { constants } from 'node:fs';
import { mkdir, open, rename, rm, type FileHandle } from 'node:fs/promises';
import { dirname, join, resolve } from 'node:path';
import type { Readable } from 'node:stream';
import { mustBeKey, newStoreKey, type Bytes, type FileStore } from './file-store';
import { diskFaultOf, StoreFault } from './store-fault';

/** Objects as files under `root`, two levels of folders deep. A file is written beside its place, to the disk, and then given its name. */
export function diskStore(root: string): FileStore {
  const placeOf = (key: string): string => {
    const name = mustBeKey(key);
    return join(resolve(/* turbopackIgnore: true */ root), 'objects', name.slice(0, 2), name.slice(2, 4), name);
  };
  const put = (key: string, body: Bytes, bytes: number): Promise<void> => onDisk(() => writeWhole(placeOf(key), body, bytes));
  const remove = (key: string): Promise<void> => onDisk(() => rm(placeOf(key), { force: true }));
  return {
    put: (key, body, { bytes }) => put(key, body, bytes),
    read: (key) => onDisk(() => openWhole(placeOf(key))),
    remove,
    check: () => canWrite(put, remove),
  };
}

async function onDisk<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    throw diskFaultOf(error);
  }
}

async function writeWhole(place: string, body: Bytes, bytes: number): Promise<void> {
  const folder = dirname(place);
  await mkdir(folder, { recursive: true, mode: 0o700 });
  const beside = `${place}.${randomUUID()}.new`;
  try {
    const file = await open(beside, 'wx', 0o600);
    try {
      if ((await writeAll(file, body)) !== bytes) throw new StoreFault('store-down', { cause: new Error('Not as many bytes as said') });
      await file.sync();
    } finally {
      await file.close();
    }
    await rename(beside, place);
  } finally {
    await rm(beside, { force: true }); // gone already when it got its name
  }
  await syncFolder(folder);
}

/** Writes all there is; answers with how many bytes that were. */
export async function writeAll(file: FileHandle, body: Bytes): Promise<number> {
  let size = 0;
  for await (const chunk of body) {
    await file.writeFile(chunk);
    size += chunk.byteLength;
  }
  return size;
}

// A name is on the disk only once its folder is.
async function syncFolder(folder: string): Promise<void> {
  const file = await open(folder, constants.O_RDONLY);
  try {
    await file.sync();
  } finally {
    await file.close();
  }
}

/** A name that leads elsewhere is none of ours: it is not followed, and counts as not there. */
async function openWhole(place: string): Promise<ReadableStream<Uint8Array> | null> {
  const file = await open(place, constants.O_RDONLY | constants.O_NOFOLLOW).catch(whereNone);
  if (file === null) return null;
  if ((await file.stat()).isFile()) return webStreamOf(file.createReadStream());
  await file.close();
  return null;
}

function whereNone(error: unknown): null {
  if (error instanceof Error && 'code' in error && (error.code === 'ENOENT' || error.code === 'ELOOP')) return null;
  throw error;
}

/** Node's readable as the web's: one chunk at a time, as fast as it is read, closed when the reader goes away. */
export function webStreamOf(readable: Readable): ReadableStream<Uint8Array> {
  const chunks: AsyncIterator<unknown, unknown> = readable[Symbol.asyncIterator]();
  return new ReadableStream<Uint8Array>(
    {
      async pull(controller) {
        const { done, value } = await chunks.next();
        if (done === true) controller.close();
        else if (value instanceof Uint8Array) controller.enqueue(value);
      },
      cancel() {
        readable.destroy();
      },
    },
    { highWaterMark: 0 },
  );
}

/** Writes a byte and takes it away again: a disk that is full or may only be read shows at that. */
async function canWrite(put: (key: string, body: Bytes, bytes: number) => Promise<void>, remove: (key: string) => Promise<void>) {
  const key = newStoreKey();
  try {
    await put(key, [Buffer.from('.')], 1);
    await remove(key);
    return true;
  } catch (error) {
    if (error instanceof StoreFault) return false;
    throw error;
  }
}
