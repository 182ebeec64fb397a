import 'server-only';

/** One part of a form: a field, or a file when it has a file name. Its body has to be read to the end before the next part comes. */
export type FormPart = { readonly name: string; readonly fileName: string | null; readonly body: AsyncIterable<Uint8Array> };

/** The body is no form as `multipart/form-data` is written (RFC 7578), or it was cut short. */
export class BadForm extends Error {}

const LARGEST_HEAD = 8 * 1024;
const MOST_PARTS = 40;
const HEAD_END = Buffer.from('\r\n\r\n');

/** The boundary that a Content-Type names; null when it is no form with files. */
export function boundaryOf(contentType: string | null): string | null {
  const found = /^multipart\/form-data\s*;(?:.*;)?\s*boundary=(?:"([^"\r\n]{1,70})"|([^\s";,]{1,70}))\s*(?:;|$)/i.exec(contentType ?? '');
  return found?.[1] ?? found?.[2] ?? null;
}

/** What has come and was not handed on yet. It never holds more than a piece of the body and the length of a boundary. */
class Held {
  bytes: Buffer = Buffer.from('\r\n'); // so that the first boundary is written like the others
  constructor(private readonly pieces: AsyncIterator<Uint8Array, unknown>) {}

  async more(): Promise<void> {
    const { done, value } = await this.pieces.next();
    if (done === true) throw new BadForm('The form was cut short');
    this.bytes = Buffer.concat([this.bytes, value]);
  }

  take(length: number): Buffer {
    const taken = this.bytes.subarray(0, length);
    this.bytes = this.bytes.subarray(length);
    return taken;
  }
}

/**
 * The parts of a form, one after the other, as they stream in: never more of the body is read than has been asked for, so whoever
 * stops asking stops the reading. The source is left as it is when reading stops early.
 */
export async function* readParts(source: AsyncIterator<Uint8Array, unknown>, boundary: string): AsyncGenerator<FormPart, void, void> {
  const mark = Buffer.from(`\r\n--${boundary}`);
  const held = new Held(source);
  await passOver(untilMark(held, mark)); // what stands before the first boundary is nobody's
  for (let count = 0; ; count += 1) {
    if (await isLast(held)) return;
    if (count === MOST_PARTS) throw new BadForm('The form has too many parts');
    const head = await readHead(held);
    const state = { ended: false };
    yield { ...head, body: partBody(held, mark, state) };
    if (!state.ended) throw new BadForm('A part was not read to its end');
  }
}

/** Reads without looking. */
async function passOver(body: AsyncIterator<Uint8Array, unknown>): Promise<void> {
  while ((await body.next()).done !== true);
}

async function* partBody(held: Held, mark: Buffer, state: { ended: boolean }): AsyncGenerator<Uint8Array, void, void> {
  yield* untilMark(held, mark);
  state.ended = true;
}

/** Bytes up to the boundary, which is taken away as well. The last bytes of a piece may be the beginning of one, and are held back. */
async function* untilMark(held: Held, mark: Buffer): AsyncGenerator<Uint8Array, void, void> {
  for (;;) {
    const at = held.bytes.indexOf(mark);
    if (at > 0) yield held.take(at);
    if (at >= 0) {
      held.take(mark.length);
      return;
    }
    const sure = held.bytes.length - mark.length + 1;
    if (sure > 0) yield held.take(sure);
    await held.more();
  }
}

/** Behind a boundary stands a line end and a part, or two dashes and nothing more that counts. */
async function isLast(held: Held): Promise<boolean> {
  while (held.bytes.length < 2) await held.more();
  const sign = held.take(2).toString('latin1');
  if (sign !== '--' && sign !== '\r\n') throw new BadForm('A boundary does not end as it must');
  return sign === '--';
}

async function readHead(held: Held): Promise<Omit<FormPart, 'body'>> {
  let end = held.bytes.indexOf(HEAD_END);
  while (end < 0) {
    if (held.bytes.length > LARGEST_HEAD) throw new BadForm('The head of a part is too long');
    await held.more();
    end = held.bytes.indexOf(HEAD_END);
  }
  const lines = held.take(end).toString('utf8').split('\r\n');
  held.take(HEAD_END.length);
  const said = lines.find((line) => /^content-disposition:/i.test(line)) ?? '';
  const name = valueIn(said, 'name');
  if (name === null || !/^content-disposition:\s*form-data\s*;/i.test(said)) throw new BadForm('A part has no name');
  return { name, fileName: valueIn(said, 'filename') };
}

const VALUES = { name: /;\s*name="([^"]*)"/i, filename: /;\s*filename="([^"]*)"/i } as const;

/** Browsers write a quotation mark within a value as %22, and a backslash as it is. */
const valueIn = (line: string, key: keyof typeof VALUES): string | null => VALUES[key].exec(line)?.[1]?.replace(/%22/g, '"') ?? null;

/** The text of a field; more than `most` bytes are no field of ours. */
export async function textOfPart({ body }: FormPart, most: number): Promise<string> {
  const pieces: Uint8Array[] = [];
  let size = 0;
  for await (const piece of body) {
    size += piece.byteLength;
    if (size > most) throw new BadForm('A field is too long');
    pieces.push(piece);
  }
  return Buffer.concat(pieces).toString('utf8');
}
