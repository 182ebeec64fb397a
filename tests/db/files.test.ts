import { randomBytes, randomUUID } from 'node:crypto';
import { existsSync, readdirSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { GET } from '@/app/api/files/[id]/route';
import { db } from '@/db/connection';
import { findFileBySha } from '@/db/files';
import { forgetPerson } from '@/db/forgotten-accounts';
import { inTransaction } from '@/db/transaction';
import type { AccountId, AccountRole } from '@/lib/access/domain/actor';
import { collectOwn } from '@/lib/accounts/collect-own';
import { cleanFiles } from '@/lib/files/clean-files';
import { DAY_BYTES, DAY_FILES, type KeptFile } from '@/lib/files/domain/kept-file';
import { keepPageSeen, type PageSeen } from '@/lib/files/keep-page-seen';
import { openFile } from '@/lib/files/open-file';
import { readFile } from '@/lib/files/read-file';
import { ok } from '@/lib/kernel/result';
import type { ActorCtx } from '@/lib/server/actor-ctx';
import { signedFileLink } from '@/lib/server/file-link';
import type { FileStore } from '@/lib/server/file-store/file-store';
import { fileStore, patient } from '@/lib/server/file-store/own-store';
import { s3Store } from '@/lib/server/file-store/s3-store';
import { StoreFault } from '@/lib/server/file-store/store-fault';
import { aPdf, aPicture } from '../builders/evil-files';
import { aKeptFile } from '../builders/kept-files';
import { startObjectServer, type ObjectServer } from '../builders/object-server';
import { ctxOf, someone, NOW } from '../builders/people';
import { aPlace } from './account-people';

const HOUR = 3_600_000;
const later = (ms: number): Date => new Date(NOW.getTime() + ms);
const root = (): string => process.env['FOOTRING_STORE_DIR'] ?? '';

const filesUnder = (folder: string): readonly string[] =>
  existsSync(join(root(), folder))
    ? readdirSync(join(root(), folder), { recursive: true, encoding: 'utf8' }).filter((name) =>
        statSync(join(root(), folder, name)).isFile(),
      )
    : [];

const page = (over: Partial<PageSeen> = {}): PageSeen => {
  const body = [aPdf()];
  return { key: randomUUID(), name: 'page.pdf', body, declaredBytes: 400, ...over };
};

/** How it ended, in a word. */
const endOf = async (ctx: ActorCtx, input: PageSeen, store?: FileStore): Promise<string> => {
  const kept = await keepPageSeen(ctx, input, store);
  return kept.ok ? 'ok' : kept.error.kind;
};

const rows = async (): Promise<readonly { readonly state: string; readonly store_key: string }[]> =>
  db<{ state: string; store_key: string }>('files').select('state', 'store_key');

/** Rows that stand without an object, and objects without a row. */
async function loose(): Promise<{ readonly rows: number; readonly objects: number }> {
  const keys = (await rows()).filter(({ state }) => state === 'ready').map((row) => row.store_key);
  const objects = filesUnder('objects').map((name) => name.slice(-32));
  return { rows: keys.filter((key) => !objects.includes(key)).length, objects: objects.filter((key) => !keys.includes(key)).length };
}

beforeAll(async () => {
  await aPlace();
  await db('sheets').insert({ region: 'dk', edition_number: 1 });
});

let number = 0;
/** An edition that names these files; `inUse` makes it the one in use. */
async function anEditionCiting(shas: readonly string[], inUse = true): Promise<void> {
  number += 1;
  const document = JSON.stringify({ sources: shas.map((sha256) => ({ fingerprint: { sha256, type: 'text/plain', bytes: 1 } })) });
  const hash = randomBytes(32).toString('hex');
  await db('editions').insert({ region: 'dk', number, hash, origin: 'seed', summary: 'tests', in_use_from: NOW, document });
  if (inUse) await db('sheets').where({ region: 'dk' }).update({ edition_number: number });
}

beforeEach(async () => {
  for (const { store_key: key } of await rows()) await fileStore().remove(key);
  for (const table of ['files', 'limits', 'request_keys']) await db(table).del();
});

describe('a page that was seen', () => {
  test('FILE-9 is kept with its fingerprint, its object and its row, and read back as it was', async () => {
    const { ctx, id } = await someone('editor');
    const kept = await keepPageSeen(ctx, page({ name: '..\\Blei & Cadmium.pdf' }));
    if (!kept.ok) throw new Error(kept.error.kind);
    const file = await findFileBySha(db, kept.value.sha256);
    expect(file).toMatchObject({
      id: kept.value.fileId,
      type: 'application/pdf',
      bytes: aPdf().length,
      ownerId: id,
      name: 'Blei & Cadmium.pdf',
      state: 'ready',
    });
    const read = await readFile(ctx, kept.value.fileId);
    const opened = read.ok ? await openFile(read.value) : read;
    expect(opened.ok && Buffer.from(await new Response(opened.value).arrayBuffer()).equals(aPdf())).toBe(true);
    expect([await loose(), filesUnder('incoming')]).toEqual([{ rows: 0, objects: 0 }, []]);
  });

  test('FILE-11 sent twice by one form, at once or later, is kept once', async () => {
    const { ctx } = await someone('editor');
    const input = page({ body: [await aPicture('png')] });
    const ends = await Promise.all([keepPageSeen(ctx, input), keepPageSeen(ctx, input), keepPageSeen(ctx, input)]);
    const again = await keepPageSeen(ctx, input);
    const ids = [...ends, again].map((end) => (end.ok ? end.value.fileId : end.error.kind));
    expect(new Set(ids).size).toBe(1);
    expect([(await rows()).length, await loose()]).toEqual([1, { rows: 0, objects: 0 }]);
    expect(await endOf(ctx, { ...page(), key: input.key, body: [Buffer.from('another')] })).toBe('key-reused');
    expect([(await rows()).length, await loose()]).toEqual([1, { rows: 0, objects: 0 }]);
  });

  test.each([
    ['wrong-type', Buffer.from('<html>')],
    ['empty', Buffer.alloc(0)],
    ['unreadable', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 0x49, 0x48, 0x44, 0x52])],
  ])('FILE-4 that is refused (%s) leaves nothing', async (kind, bytes) => {
    const { ctx } = await someone('editor');
    expect(await endOf(ctx, page({ body: [bytes] }))).toBe(kind);
    expect([await rows(), filesUnder('objects'), filesUnder('incoming')]).toEqual([[], [], []]);
  });

  test('FILE-4 that says it is too large is refused before a byte is read', async () => {
    const { ctx } = await someone('editor');
    const body = {
      [Symbol.iterator]: (): Iterator<Uint8Array> => {
        throw new Error('It was read.');
      },
    };
    expect(await endOf(ctx, page({ body, declaredBytes: 15 * 1024 * 1024 + 1 }))).toBe('too-large');
  });

  test('S49 FILE-11 is looked at 120 times an hour at most, kept or refused', async () => {
    const { ctx } = await someone('editor');
    for (let count = 0; count < 120; count += 1) expect(await endOf(ctx, page({ body: [] }))).toBe('empty');
    expect(await endOf(ctx, page())).toBe('too-many');
  });
});

describe('FILE-11 S47 a day’s worth', () => {
  test('is 60 files, in any burst, and begins anew after a day', async () => {
    const { ctx, id } = await someone('editor');
    for (let count = 0; count < DAY_FILES - 2; count += 1) await aKeptFile(id);
    const ends = await Promise.all(Array.from({ length: 6 }, () => endOf(ctx, page())));
    expect(ends.sort()).toEqual(['ok', 'ok', 'quota', 'quota', 'quota', 'quota']);
    expect(await endOf({ ...ctx, now: later(24 * HOUR) }, page())).toBe('ok');
    expect((await loose()).objects).toBe(0);
  });

  test('is 100 MB, to the byte', async () => {
    const { ctx, id } = await someone('editor');
    const { id: file } = await aKeptFile(id);
    const weigh = (bytes: number) => db('files').where({ id: file }).update({ bytes });
    await weigh(DAY_BYTES - aPdf().length + 1);
    expect(await endOf(ctx, page())).toBe('quota');
    await weigh(DAY_BYTES - aPdf().length);
    expect(await endOf(ctx, page())).toBe('ok');
  });

  test('is each person’s own', async () => {
    const { id } = await someone('editor');
    for (let count = 0; count < DAY_FILES; count += 1) await aKeptFile(id);
    expect(await endOf((await someone('editor')).ctx, page())).toBe('ok');
  });
});

describe('FILE-10 F07 a store that fails', () => {
  let server: ObjectServer;
  beforeAll(async () => {
    server = await startObjectServer();
  });
  afterAll(() => server.end());

  test.each([
    ['broken', 'store-down'],
    ['cut', 'store-down'],
    ['lying', 'store-down'],
    ['full', 'store-full'],
    ['down', 'store-down'],
  ] as const)('being %s: %s, no row without its object, nothing loose after the cleaner', async (mood, kind) => {
    const { ctx } = await someone('editor');
    const store = patient(s3Store(server.settings), mood === 'down' ? 1_000 : 9_000);
    server.feel(mood);
    expect(await endOf(ctx, page(), store)).toBe(kind);
    expect((await rows()).filter(({ state }) => state === 'ready')).toEqual([]);
    server.feel('broken');
    await cleanFiles({ db, now: later(2 * HOUR) }, store);
    server.feel('well');
    await cleanFiles({ db, now: later(2 * HOUR) }, store);
    expect([await rows(), server.objects.size, filesUnder('incoming')]).toEqual([[], 0, []]);
    expect(await endOf(ctx, page(), store)).toBe('ok');
    const kept = (await rows()).map((row) => `/potshop/${row.store_key}`);
    expect([...server.objects.keys()]).toEqual(kept);
    for (const row of await rows()) await store.remove(row.store_key);
  });

  test('F08 while a file is received: refused as full, and nothing is left', async () => {
    const { ctx } = await someone('editor');
    async function* filling(): AsyncGenerator<Uint8Array, void, void> {
      yield await Promise.resolve(Buffer.from('%PDF-1.4'));
      throw new StoreFault('store-full');
    }
    expect(await endOf(ctx, page({ body: filling() }))).toBe('store-full');
    expect([await rows(), filesUnder('incoming')]).toEqual([[], []]);
  });

  test('a file whose object is missing is told as a store that is down, not as an empty file', async () => {
    const { id } = await someone('editor');
    const file = await aKeptFile(id);
    await fileStore().remove(file.storeKey);
    expect(await openFile(file)).toEqual({ ok: false, error: { kind: 'store-down' } });
  });
});

describe('FILE-9 the cleaner', () => {
  test('removes what has been coming for an hour, object and row, and nothing that is younger or kept', async () => {
    const { id } = await someone('editor');
    const [old, young, kept] = [
      await aKeptFile(id, { state: 'coming' }),
      await aKeptFile(id, { state: 'coming', madeAt: later(HOUR) }),
      await aKeptFile(id),
    ];
    expect(await cleanFiles({ db, now: later(HOUR + 1) })).toBe(1);
    const there = async ({ storeKey }: KeptFile): Promise<boolean> => {
      const stream = await fileStore().read(storeKey);
      await stream?.cancel();
      return stream !== null;
    };
    expect([await there(old), await there(young), await there(kept)]).toEqual([false, true, true]);
    expect(((await db('files').pluck('id')) as string[]).toSorted()).toEqual([young.id, kept.id].toSorted());
  });

  test('FILE-12 S57 leaves a forgotten person’s files while something cites them, and nothing that says whose they were', async () => {
    const { id } = await someone('editor');
    const files = {
      free: await aKeptFile(id, { name: 'Wilma.pdf' }),
      cited: await aKeptFile(id),
      earlier: await aKeptFile(id),
      open: await aKeptFile(id),
      entered: await aKeptFile(id),
    };
    const stays = await aKeptFile((await someone('editor')).id);
    await anEditionCiting([files.earlier.sha256]);
    await anEditionCiting([files.cited.sha256]);
    const amendment = await anAmendmentCiting((await someone('editor')).id, files.open.sha256);
    await db('amendment_entries').insert({
      amendment_id: amendment,
      item: 'source:x',
      version: 1,
      saved_at: NOW,
      entered: JSON.stringify({ fingerprint: `${files.entered.sha256} text/plain 21` }),
    });
    await inTransaction(db, async (trx) => {
      await forgetPerson(trx, id);
      return ok(null);
    });
    expect(JSON.stringify(await db('files').select('*'))).not.toMatch(new RegExp(`${id}|Wilma`));
    await cleanFiles({ db, now: NOW });
    const left = [files.cited, files.earlier, files.open, files.entered, stays].map((file) => file.id);
    expect(((await db('files').pluck('id')) as string[]).toSorted()).toEqual(left.toSorted());
    await db('amendment_entries').del();
    await db('amendments').del();
    await cleanFiles({ db, now: NOW });
    expect(((await db('files').pluck('id')) as string[]).toSorted()).toEqual([files.cited.id, files.earlier.id, stays.id].toSorted());
    expect(await loose()).toEqual({ rows: 0, objects: 0 });
  });

  async function anAmendmentCiting(authorId: AccountId, sha256: string): Promise<string> {
    const id = randomUUID();
    const document = JSON.stringify({ sources: [{ fingerprint: { sha256 } }] });
    const row = {
      id,
      region: 'dk',
      author_id: authorId,
      state: 'draft',
      version: 1,
      summary: '',
      intended: '{}',
      document,
      made_at: NOW,
      changed_at: NOW,
    };
    await db('amendments').insert(row);
    return id;
  }

  test('FILE-12 the archive of a person lists the files, without where they lie', async () => {
    const { id, ctx } = await someone('editor');
    const file = await aKeptFile(id);
    await aKeptFile((await someone('editor')).id);
    const own = await collectOwn(ctx, id, () => Promise.resolve());
    const { storeKey, ownerId: _, ...told } = file;
    expect(own['files']).toEqual([told]);
    expect(JSON.stringify(own)).not.toContain(storeKey);
  });
});

describe('FILE-6 S48 S25 who may read a file', () => {
  const ROLES: readonly AccountRole[] = ['maker', 'editor', 'moderator', 'steward'];
  type Cell = { readonly own: string; readonly free: string; readonly cited: string; readonly formerly: string; readonly coming: string };
  const NONE = { own: 'not-allowed', free: 'not-allowed', cited: 'not-allowed', formerly: 'not-allowed', coming: 'not-allowed' };
  const ANY = { own: 'ok', free: 'ok', cited: 'ok', formerly: 'ok', coming: 'not-found' };
  const MAY: Readonly<Record<AccountRole, Cell>> = {
    maker: NONE,
    editor: { own: 'ok', free: 'not-found', cited: 'ok', formerly: 'not-found', coming: 'not-found' },
    moderator: ANY,
    steward: ANY,
  };

  test.each(ROLES)('%s', async (role) => {
    const { ctx, id } = await someone(role);
    const { id: other } = await someone('editor');
    const files = {
      own: await aKeptFile(id),
      free: await aKeptFile(other),
      cited: await aKeptFile(other),
      formerly: await aKeptFile(other),
      coming: await aKeptFile(other, { state: 'coming' }),
    };
    await anEditionCiting([files.formerly.sha256, files.cited.sha256]);
    await anEditionCiting([files.cited.sha256]);
    const read = async ({ id: file }: KeptFile): Promise<string> => {
      const end = await readFile(ctx, file);
      return end.ok ? 'ok' : end.error.kind;
    };
    expect({
      own: await read(files.own),
      free: await read(files.free),
      cited: await read(files.cited),
      formerly: await read(files.formerly),
      coming: await read(files.coming),
    }).toEqual(MAY[role]);
    const anon = await readFile(ctxOf(), files.cited.id);
    expect(anon.ok ? 'ok' : anon.error.kind).toBe('sign-in');
  });
});

describe('FILE-7 S48 a signed link', () => {
  /** The handler reads the clock itself. */
  const soon = (ms: number): Date => new Date(Date.now() + ms);
  const get = (path: string): Promise<Response> =>
    GET(new Request(`http://footring.example.test${path}`), { params: Promise.resolve({ id: /files\/([^?]*)/.exec(path)?.[1] ?? '' }) });
  const aFile = async (over: Partial<KeptFile> = {}): Promise<KeptFile> => aKeptFile((await someone('editor')).id, over);

  test('opens its file for some minutes, a picture in its place and all else to be saved', async () => {
    const [text, picture] = [await aFile(), await aFile({ type: 'image/png', name: 'ä.html' })];
    const [saved, shown] = [await get(signedFileLink(text.id, soon(60_000))), await get(signedFileLink(picture.id, soon(60_000)))];
    expect([saved.status, await saved.text(), saved.headers.get('content-disposition')]).toEqual([
      200,
      'A page that was seen.',
      `attachment; filename="page.txt"; filename*=UTF-8''page.txt`,
    ]);
    expect([shown.status, shown.headers.get('content-type'), shown.headers.get('content-disposition')]).toEqual([
      200,
      'image/png',
      `inline; filename="_.html.png"; filename*=UTF-8''%C3%A4.html.png`,
    ]);
    await shown.body?.cancel();
    for (const { headers } of [saved, shown]) {
      expect([headers.get('x-content-type-options'), headers.get('content-security-policy'), headers.get('cache-control')]).toEqual([
        'nosniff',
        "sandbox; default-src 'none'",
        'private, no-store',
      ]);
    }
  });

  test('that is over, or was made for longer than ten minutes, is 403', async () => {
    const { id } = await aFile();
    for (const ms of [-1_000, 0, 11 * 60_000]) expect((await get(signedFileLink(id, soon(ms)))).status).toBe(403);
  });

  test('that was changed in any part is 403', async () => {
    const [file, other] = [await aFile(), await aFile()];
    const link = signedFileLink(file.id, soon(60_000));
    const changed = [
      link.replace(file.id, other.id),
      link.replace(/until=\d+/, (until) => `${until.slice(0, -1)}${String((Number(until.slice(-1)) + 1) % 10)}`),
      link.replace(/until=\d+&/, ''),
      link.replace(/&sig=.*/, ''),
      link.replace(/&sig=.*/, '&sig='),
      link.replace(/.$/, (last) => String.fromCharCode(last.charCodeAt(0) ^ 1)),
      `${link}&sig=${link.slice(-43)}x`,
      `${link}&more=1`,
      link.replace('until=', 'until=0'),
    ];
    expect(await Promise.all(changed.map(async (path) => (await get(path)).status))).toEqual(changed.map(() => 403));
  });

  test('of a file that is gone is 404', async () => {
    const { id } = await aFile();
    await db('files').where({ id }).del();
    expect((await get(signedFileLink(id, soon(60_000)))).status).toBe(404);
  });

  test.each(['..%2f..%2fetc%2fpasswd', '../../../etc/passwd', '%00', 'x'.repeat(300), randomUUID().toUpperCase().slice(1)])(
    'FILE-5 S43 the address of %j is of no file',
    async (id) => {
      const answer = await GET(new Request('http://footring.example.test/api/files/x'), { params: Promise.resolve({ id }) });
      expect(answer.status).toBe(404);
    },
  );
});
