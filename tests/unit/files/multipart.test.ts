import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadForm, boundaryOf, readParts, textOfPart, type FormPart } from '@/lib/server/multipart';

type Read = { readonly name: string; readonly fileName: string | null; readonly text: string };

/** The bytes in pieces of so many, as a line may bring them. */
async function* cut(bytes: Uint8Array, size: number): AsyncGenerator<Uint8Array, undefined, void> {
  for (let at = 0; at < bytes.length; at += size) yield await Promise.resolve(bytes.subarray(at, at + size));
}

async function readAll(body: Uint8Array, boundary: string, size: number): Promise<readonly Read[]> {
  const read: Read[] = [];
  for await (const part of readParts(cut(body, size), boundary)) {
    read.push({ name: part.name, fileName: part.fileName, text: await textOfPart(part, 1_000_000) });
  }
  return read;
}

const formOf = (...parts: readonly string[]): Buffer => Buffer.from(`${parts.map((part) => `--cut\r\n${part}\r\n`).join('')}--cut--\r\n`);
const field = (name: string, text: string): string => `Content-Disposition: form-data; name="${name}"\r\n\r\n${text}`;

describe('FILE-13 a form as a browser writes it', () => {
  test('is read the same however it is cut into pieces', async () => {
    const form = new FormData();
    form.set('key', 'one');
    form.set('back', '/bench?a=1&b="2"');
    form.set('file', new File(['first\r\n--cut\r\nlast'], 'a "page"; of\\mine.txt', { type: 'text/plain' }));
    const packed = new Response(form);
    const boundary = boundaryOf(packed.headers.get('content-type')) ?? '';
    const body = new Uint8Array(await packed.arrayBuffer());
    const whole = await readAll(body, boundary, body.length);
    expect(whole).toEqual([
      { name: 'key', fileName: null, text: 'one' },
      { name: 'back', fileName: null, text: '/bench?a=1&b="2"' },
      { name: 'file', fileName: 'a "page"; of\\mine.txt', text: 'first\r\n--cut\r\nlast' },
    ]);
    for (const size of [1, 2, 3, 7, 64, 300]) expect(await readAll(body, boundary, size)).toEqual(whole);
  });

  test('gives back any bytes, boundaries nearly written among them', async () => {
    const bit = fc.constantFrom('\r\n--cut', '\r\n--cu', '\r', '\n', '--cut', '--', 'x', '\u0000', '\r\n\r\n');
    await fc.assert(
      fc.asyncProperty(fc.array(bit, { maxLength: 12 }), fc.integer({ min: 1, max: 40 }), async (bits, size) => {
        const text = bits.join('').replaceAll('\r\n--cut', '\r\n--cur');
        fc.pre(!`\r\n${text}`.includes('\r\n--cut'));
        const read = await readAll(formOf(field('a', text), field('b', 'end')), 'cut', size);
        expect(read.map((part) => part.text)).toEqual([text, 'end']);
      }),
      { seed: 20261201, numRuns: 300 },
    );
  });

  test('what stands before the first boundary and after the last is nobody’s', async () => {
    const body = Buffer.concat([Buffer.from('hello\r\n'), formOf(field('a', '1')), Buffer.from('goodbye')]);
    expect(await readAll(body, 'cut', 5)).toEqual([{ name: 'a', fileName: null, text: '1' }]);
  });
});

describe('FILE-13 a form is refused that', () => {
  const long = 'x'.repeat(9_000);
  test.each([
    ['has no end', Buffer.from(formOf(field('a', '1')).subarray(0, -6))],
    ['was cut in a part', Buffer.from(`--cut\r\n${field('a', 'half')}`)],
    ['was cut in a head', Buffer.from('--cut\r\nContent-Disp')],
    ['has nothing in it', Buffer.alloc(0)],
    ['has a part without a name', formOf('Content-Disposition: form-data\r\n\r\n1')],
    ['has a part without a head', formOf('X: y\r\n\r\n1')],
    ['has a part that is something else', formOf('Content-Disposition: attachment; name="a"\r\n\r\n1')],
    ['has a head longer than a head is', Buffer.from(`--cut\r\nX: ${long}`)],
    ['has a boundary with something behind it', Buffer.from('--cutter\r\n\r\n')],
    ['has more parts than any form', formOf(...Array.from({ length: 41 }, () => field('a', '1')))],
  ])('%s', async (_, body) => {
    for (const size of [1, 1000]) await expect(readAll(body, 'cut', size)).rejects.toThrow(BadForm);
  });

  test('has a field longer than a field is', async () => {
    const parts = readParts(cut(formOf(field('a', long)), 100), 'cut');
    const first = (await parts.next()).value as FormPart;
    await expect(textOfPart(first, 4_096)).rejects.toThrow(BadForm);
  });
});

test('FILE-4 S47 of a form nothing is read that was not asked for', async () => {
  let sent = 0;
  async function* endless(): AsyncGenerator<Uint8Array, undefined, void> {
    yield Buffer.from('--cut\r\nContent-Disposition: form-data; name="file"; filename="x"\r\n\r\n');
    const piece = Buffer.alloc(64 * 1024, 'x');
    for (;;) {
      sent += piece.byteLength;
      yield await Promise.resolve(piece);
    }
  }
  const part = (await readParts(endless(), 'cut').next()).value as FormPart;
  let read = 0;
  for await (const piece of part.body) {
    read += piece.byteLength;
    if (read > 15 * 1024 * 1024) break;
  }
  expect(sent - read).toBeLessThanOrEqual(64 * 1024);
});

test.each([
  ['multipart/form-data; boundary=----WebKitFormBoundaryabc', '----WebKitFormBoundaryabc'],
  ['multipart/form-data; charset=utf-8; boundary="a b"', 'a b'],
  ['Multipart/Form-Data;boundary=x', 'x'],
  ['multipart/form-data', null],
  ['multipart/mixed; boundary=x', null],
  ['application/x-www-form-urlencoded', null],
  [`multipart/form-data; boundary=${'x'.repeat(71)}`, null],
  [null, null],
])('FILE-13 the boundary of %s is %s', (type, boundary) => {
  expect(boundaryOf(type)).toBe(boundary);
});
