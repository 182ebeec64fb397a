import { deflateSync } from 'node:zlib';
import { zipSync } from 'fflate';
import sharp from 'sharp';

const latin = (text: string): Buffer => Buffer.from(text, 'latin1');
export const PAGE = '<!doctype html><html><script>document.title = "ran"</script></html>';

/** A picture with something on it, so that its pixels can be told from another's. */
export const aPicture = (format: 'jpeg' | 'png' | 'webp', size = 64): Promise<Buffer> =>
  sharp({ create: { width: size, height: size, channels: 3, background: { r: 31, g: 78, b: 122 } } })
    .toFormat(format)
    .toBuffer();

/** A photograph that says where it was taken, by what camera, and whose it is. */
export const aPlacedPhoto = (): Promise<Buffer> =>
  sharp({ create: { width: 64, height: 48, channels: 3, background: '#b5651d' } })
    .jpeg()
    .withExif({
      IFD0: { Make: 'Kestrelcam', Artist: 'Wilma Kestrel' },
      IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '55/1 40/1 0/1', GPSLongitudeRef: 'E', GPSLongitude: '12/1 34/1 0/1' },
    })
    .toBuffer();

/** A picture behind whose end a page hangs. */
export const aPictureWithPage = async (): Promise<Buffer> => Buffer.concat([await aPicture('jpeg'), latin(PAGE)]);

/** A picture whose comment is a page: it stands near the front, where a browser that guesses would look. */
export async function aPictureAroundPage(): Promise<Buffer> {
  const picture = await aPicture('jpeg');
  const said = latin(PAGE);
  const head = Buffer.from([0xff, 0xfe, 0, 0]);
  head.writeUInt16BE(said.length + 2, 2);
  return Buffer.concat([picture.subarray(0, 2), head, said, picture.subarray(2)]);
}

/** Read as a script, its first bytes are a name that something is assigned to. */
export const aScriptInGif = (): Buffer => latin('GIF89a/*\x01\x00\x01\x00\x00\x00\x00*/=1;alert(1);');

export const aPdf = (tail = ''): Buffer =>
  latin(
    `%PDF-1.4\n1 0 obj<</Type/Catalog/Pages 2 0 R>>endobj\n2 0 obj<</Type/Pages/Kids[3 0 R]/Count 1>>endobj\n3 0 obj<</Type/Page/Parent 2 0 R/MediaBox[0 0 9 9]>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n${tail}`,
  );
export const aPdfWithPage = (): Buffer => aPdf(PAGE);
/** A page first, and a PDF behind it: readers of PDFs look for their mark in the first kilobyte. */
export const aPageWithPdf = (): Buffer => Buffer.concat([latin(PAGE), aPdf()]);
export const aScriptedDrawing = (): Buffer => latin('<svg xmlns="http://www.w3.org/2000/svg"><script>alert(1)</script></svg>');

/** A PDF that says it has a million pages, all of them itself. */
export const aPdfOfItself = (): Buffer =>
  latin(
    `%PDF-1.4\n1 0 obj<</Type/Catalog/Pages 2 0 R>>endobj\n2 0 obj<</Type/Pages/Kids[${'2 0 R '.repeat(100_000)}]/Count 1000000>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n`,
  );

/** Ten megabytes of nothing, packed small. */
export const aPackedBomb = (): Buffer => Buffer.from(zipSync({ 'bomb.txt': Buffer.alloc(10_000_000) }, { level: 9 }));

function crcOf(bytes: Uint8Array): number {
  let crc = 0xffffffff;
  for (const byte of bytes) {
    crc ^= byte;
    for (let bit = 0; bit < 8; bit += 1) crc = crc & 1 ? (crc >>> 1) ^ 0xedb88320 : crc >>> 1;
  }
  return (crc ^ 0xffffffff) >>> 0;
}

function chunk(type: string, data: Buffer): Buffer {
  const named = Buffer.concat([latin(type), data]);
  const length = Buffer.alloc(4);
  length.writeUInt32BE(data.length);
  const crc = Buffer.alloc(4);
  crc.writeUInt32BE(crcOf(named));
  return Buffer.concat([length, named, crc]);
}

/** A PNG of so many pixels a side, one bit each, all alike: little to send, much to unpack. */
export function aPngBomb(side: number): Buffer {
  const head = Buffer.alloc(13);
  head.writeUInt32BE(side, 0);
  head.writeUInt32BE(side, 4);
  head.set([1, 0, 0, 0, 0], 8);
  const rows = deflateSync(Buffer.alloc((1 + Math.ceil(side / 8)) * side), { level: 9 });
  const mark = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);
  return Buffer.concat([mark, chunk('IHDR', head), chunk('IDAT', rows), chunk('IEND', Buffer.alloc(0))]);
}
