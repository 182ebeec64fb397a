import 'server-only';
import { createHash, randomUUID, type Hash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readdir, readFile, rm, stat, type FileHandle } from 'node:fs/promises';
import { join, resolve } from 'node:path';
import { err, ok, type Result } from '@/lib/kernel/result';
import { readEnv } from '../env';
import type { Bytes } from './file-store';
import { diskFaultOf } from './store-fault';

/** A file as it came, in a folder of ours under a name of ours. It is there as long as the work on it. */
export type Incoming = {
  readonly path: string;
  readonly bytes: number;
  /** SHA-256 of what came, in hexadecimal. */
  readonly sha256: string;
  readonly stream: () => Bytes;
  /** All of it. Only for what is known to be small. */
  readonly whole: () => Promise<Buffer>;
};

export type NotReceived = { readonly kind: 'too-large' } | { readonly kind: 'empty' };

/** What a process that was killed left behind is cleared away when it is older than this. */
const STALE_MS = 3_600_000;
let sweptAt = 0;

const folder = (): string => join(resolve(/* turbopackIgnore: true */ readEnv().storeDir), 'incoming');

/**
 * Takes in what streams, up to `most` bytes, and lets `work` look at it; whatever the end, nothing stays behind. Stops reading at the
 * first piece that is too much. Throws a `StoreFault` when the disk is full or away, and whatever `source` throws.
 */
export async function receive<T, E>(
  source: Bytes,
  most: number,
  work: (incoming: Incoming) => Promise<Result<T, E>>,
): Promise<Result<T, E | NotReceived>> {
  const path = await makePlace();
  try {
    const taken = await takeIn(path, source, most);
    if (!taken.ok) return taken;
    return await work({ ...taken.value, path, stream: () => createReadStream(path), whole: () => readFile(path) });
  } finally {
    await rm(path, { force: true });
  }
}

async function makePlace(): Promise<string> {
  try {
    await mkdir(folder(), { recursive: true, mode: 0o700 });
    if (Date.now() - sweptAt > STALE_MS) {
      sweptAt = Date.now();
      await sweepStale(new Date(sweptAt - STALE_MS));
    }
    return join(folder(), randomUUID());
  } catch (error) {
    throw diskFaultOf(error);
  }
}

/** Clears away what was last written before `since`. */
export async function sweepStale(since: Date): Promise<void> {
  for (const name of await readdir(folder())) {
    const path = join(folder(), name);
    const found = await stat(path).catch(() => null); // gone meanwhile
    if (found !== null && found.mtime < since) await rm(path, { force: true });
  }
}

type Taken = { readonly bytes: number; readonly sha256: string };

async function takeIn(path: string, source: Bytes, most: number): Promise<Result<Taken, NotReceived>> {
  const file = await onDisk(() => open(path, 'wx', 0o600));
  const hash = createHash('sha256');
  try {
    const bytes = await copy(file, source, most, hash);
    if (bytes > most) return err({ kind: 'too-large' });
    return bytes === 0 ? err({ kind: 'empty' }) : ok({ bytes, sha256: hash.digest('hex') });
  } finally {
    await onDisk(() => file.close());
  }
}

/** Answers with how many bytes came; more than `most` as soon as that is known. */
async function copy(file: FileHandle, source: Bytes, most: number, hash: Hash): Promise<number> {
  let bytes = 0;
  for await (const chunk of source) {
    bytes += chunk.byteLength;
    if (bytes > most) return bytes;
    hash.update(chunk);
    await onDisk(() => file.writeFile(chunk));
  }
  return bytes;
}

async function onDisk<T>(work: () => Promise<T>): Promise<T> {
  try {
    return await work();
  } catch (error) {
    throw diskFaultOf(error);
  }
}
