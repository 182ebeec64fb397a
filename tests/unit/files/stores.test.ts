import { spawnSync } from 'node:child_process';
import { mkdirSync, mkdtempSync, readdirSync, rmSync, statSync, symlinkSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { diskStore } from '@/lib/server/file-store/disk-store';
import { newStoreKey, type FileStore } from '@/lib/server/file-store/file-store';
import { patient } from '@/lib/server/file-store/own-store';
import { s3Store } from '@/lib/server/file-store/s3-store';
import { StoreFault } from '@/lib/server/file-store/store-fault';
import { startObjectServer, type Mood, type ObjectServer } from '../../builders/object-server';

const root = mkdtempSync(join(tmpdir(), 'footring-stores-'));
afterAll(() => {
  rmSync(root, { recursive: true, force: true });
});

const KIND = (bytes: number) => ({ type: 'application/pdf', bytes });
const textOf = async (stream: ReadableStream<Uint8Array> | null): Promise<string | null> =>
  stream === null ? null : new Response(stream).text();
const filesUnder = (folder: string): readonly string[] =>
  readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => statSync(join(folder, name)).isFile());
const kindOf = async (work: Promise<unknown>): Promise<string> => {
  try {
    await work;
    return 'ok';
  } catch (error) {
    if (error instanceof StoreFault) return error.kind;
    throw error;
  }
};

async function* pieces(...texts: readonly string[]): AsyncGenerator<Uint8Array, void, void> {
  for (const text of texts) yield await Promise.resolve(Buffer.from(text));
}

/** What every store does, however it does it. */
async function putsAndGivesBack(store: FileStore): Promise<void> {
  const [first, second] = [newStoreKey(), newStoreKey()];
  expect(await store.read(first)).toBeNull();
  await store.put(first, pieces('in ', 'pieces'), KIND(9));
  await store.put(second, [Buffer.from('whole')], KIND(5));
  expect([await textOf(await store.read(first)), await textOf(await store.read(second))]).toEqual(['in pieces', 'whole']);
  const large = Buffer.alloc(15 * 1024 * 1024, 'pot');
  await store.put(second, [large], KIND(large.byteLength));
  expect((await new Response(await store.read(second)).arrayBuffer()).byteLength).toBe(large.byteLength);
  await store.remove(first);
  await store.remove(first);
  expect([await store.read(first), await store.check()]).toEqual([null, true]);
  await store.remove(second);
}

describe('a folder', () => {
  const folder = join(root, 'disk');
  const store = diskStore(folder);

  test('keeps objects and gives them back, two folders deep, readable by its owner alone', async () => {
    await putsAndGivesBack(store);
    const key = newStoreKey();
    await store.put(key, [Buffer.from('x')], KIND(1));
    expect(filesUnder(folder)).toEqual([join('objects', key.slice(0, 2), key.slice(2, 4), key)]);
    expect(statSync(join(folder, 'objects', key.slice(0, 2), key.slice(2, 4), key)).mode & 0o777).toBe(0o600);
    await store.remove(key);
  });

  test('FILE-10 F07 shows no half of an object: not of one that breaks off, nor of one that is shorter than it said', async () => {
    async function* broken(): AsyncGenerator<Uint8Array, void, void> {
      yield await Promise.resolve(Buffer.from('half'));
      throw Object.assign(new Error('broke off'), { code: 'EIO', syscall: 'read' });
    }
    expect(await kindOf(store.put(newStoreKey(), broken(), KIND(8)))).toBe('store-down');
    expect(await kindOf(store.put(newStoreKey(), pieces('half'), KIND(8)))).toBe('store-down');
    expect(filesUnder(folder)).toEqual([]);
  });

  test('FILE-5 S43 follows no link that leads elsewhere, and takes no folder for an object', async () => {
    const outside = join(root, 'secret.txt');
    writeFileSync(outside, 'secret');
    const [link, place] = [newStoreKey(), newStoreKey()];
    for (const key of [link, place]) mkdirSync(join(folder, 'objects', key.slice(0, 2), key.slice(2, 4)), { recursive: true });
    symlinkSync(outside, join(folder, 'objects', link.slice(0, 2), link.slice(2, 4), link));
    mkdirSync(join(folder, 'objects', place.slice(0, 2), place.slice(2, 4), place));
    expect([await store.read(link), await store.read(place)]).toEqual([null, null]);
    for (const key of ['../../secret.txt', outside, `${'a'.repeat(30)}/.`]) await expect(store.read(key)).rejects.toThrow('no key');
  });

  test('FILE-10 says it is down where it may not write', async () => {
    writeFileSync(join(root, 'a-file'), '');
    const nowhere = diskStore(join(root, 'a-file', 'store'));
    expect(await nowhere.check()).toBe(false);
    expect(await kindOf(nowhere.put(newStoreKey(), pieces('x'), KIND(1)))).toBe('store-down');
  });
});

describe('FILE-10 F08 a folder on a disk of 50 MB', () => {
  const volume = join(root, 'small');
  mkdirSync(volume);
  let isMounted = false;
  beforeAll(() => {
    isMounted = spawnSync('mount', ['-t', 'tmpfs', '-o', 'size=50m', 'tmpfs', volume]).status === 0;
    if (!isMounted) console.warn('F08 was not tried: this user may not mount a small disk.');
  });
  afterAll(() => {
    if (isMounted) spawnSync('umount', [volume]);
  });

  test('says it is full, shows no half, still reads, and works again once there is room', async ({ skip }) => {
    skip(!isMounted, 'no small disk');
    const store = diskStore(volume);
    const large = Buffer.alloc(15 * 1024 * 1024, 'x');
    const kept: string[] = [];
    let end = 'ok';
    while (end === 'ok') {
      const key = newStoreKey();
      end = await kindOf(store.put(key, [large], KIND(large.byteLength)));
      if (end === 'ok') kept.push(key);
    }
    expect([end, kept.length]).toEqual(['store-full', 3]);
    expect(filesUnder(volume)).toHaveLength(3);
    const [first = ''] = kept;
    expect((await new Response(await store.read(first)).arrayBuffer()).byteLength).toBe(large.byteLength);
    spawnSync('dd', ['if=/dev/zero', `of=${join(volume, 'filler')}`, 'bs=4k']);
    expect(await store.check()).toBe(false);
    rmSync(join(volume, 'filler'));
    expect(await store.check()).toBe(true);
    await store.remove(first);
    expect(await kindOf(store.put(newStoreKey(), [large], KIND(large.byteLength)))).toBe('ok');
  });
});

describe('a bucket', () => {
  test('of a known stand-in keeps objects and gives them back', async () => {
    const S3rver = createRequire(import.meta.url)('s3rver') as new (options: object) => S3Stand;
    const directory = join(root, 's3rver');
    mkdirSync(directory);
    const stand = new S3rver({ port: 0, address: '127.0.0.1', silent: true, directory, configureBuckets: [{ name: 'potshop' }] });
    const { port } = await stand.run();
    const endpoint = `http://127.0.0.1:${String(port)}`;
    const settings = { endpoint, region: 'us-east-1', bucket: 'potshop', key: 'S3RVER', secret: 'S3RVER' };
    await putsAndGivesBack(s3Store(settings));
    expect(await s3Store({ ...settings, bucket: 'no-such-bucket' }).check()).toBe(false);
    await stand.close();
  });

  describe('behind a server that behaves badly', () => {
    let server: ObjectServer;
    beforeAll(async () => {
      server = await startObjectServer();
    });
    beforeEach(() => {
      server.feel('well');
    });
    afterAll(() => server.end());

    test('keeps objects and gives them back, each request signed', async () => {
      await putsAndGivesBack(s3Store(server.settings));
      expect(server.unsigned).toEqual([]);
      expect(server.objects.size).toBe(0);
    });

    test.each([
      ['broken', 'store-down'],
      ['full', 'store-full'],
      ['cut', 'store-down'],
      ['lying', 'store-down'],
    ] as const)('FILE-10 F07 that is %s, says %s and keeps nobody waiting', async (mood, kind) => {
      server.feel(mood);
      const store = patient(s3Store(server.settings));
      expect(await kindOf(store.put(newStoreKey(), [Buffer.alloc(2_000_000)], KIND(2_000_000)))).toBe(kind);
    });

    test('FILE-10 F07 that never answers, says it is down', async () => {
      server.feel('down');
      const store = patient(s3Store(server.settings), 1_000);
      const end = (work: Promise<unknown>): Promise<string> => kindOf(work);
      const key = newStoreKey();
      expect(
        await Promise.all([end(store.put(key, pieces('x'), KIND(1))), end(store.read(key)), end(store.remove(key)), end(store.check())]),
      ).toEqual(['store-down', 'store-down', 'store-down', 'store-down']);
    });

    test.each(['down', 'broken'] as const)('FILE-10 that is %s, is not well', async (mood: Mood) => {
      server.feel(mood);
      expect(await s3Store(server.settings).check()).toBe(false);
    });

    test('FILE-10 F07 that is slow, is waited for', async () => {
      server.feel('slow');
      expect(await kindOf(s3Store(server.settings).put(newStoreKey(), pieces('x'), KIND(1)))).toBe('ok');
    });

    test('FILE-10 that is not there at all, says it is down', async () => {
      const gone = s3Store({ ...server.settings, endpoint: 'http://127.0.0.1:1' });
      expect([await kindOf(gone.put(newStoreKey(), pieces('x'), KIND(1))), await gone.check()]).toEqual(['store-down', false]);
    });
  });
});

type S3Stand = { readonly run: () => Promise<{ readonly port: number }>; readonly close: () => Promise<void> };
