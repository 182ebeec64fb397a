import 'server-only';
import sharp, { type Sharp } from 'sharp';
import { MOST_PIXELS, type FileType } from '@/lib/files/domain/kept-file';
import { err, ok, type Result } from '@/lib/kernel/result';

const AT_ONCE = 2;
const PATIENCE_S = 10;
const QUALITY = 92;

export type ImageType = Extract<FileType, `image/${string}`>;
export type BadImage = { readonly kind: 'too-many-pixels' } | { readonly kind: 'unreadable' };

// Of all that the library reads, only what is kept here: a flaw in another reader is none of ours.
sharp.block({ operation: ['VipsForeignLoad'] });
sharp.unblock({ operation: ['VipsForeignLoadJpegFile', 'VipsForeignLoadPngFile', 'VipsForeignLoadWebpFile'] });
sharp.cache(false);
sharp.concurrency(1);

const FORMAT: Readonly<Record<ImageType, (image: Sharp) => Sharp>> = {
  'image/jpeg': (image) => image.jpeg({ quality: QUALITY }),
  'image/png': (image) => image.png(),
  'image/webp': (image) => image.webp({ quality: QUALITY }),
};

/**
 * The picture of a file, drawn anew in its own format: of the file nothing is left but what one sees. Where it was taken, by what and
 * by whom is gone, and so is whatever was hung on behind it. Of a moving picture the first frame stays. How large it is is read from
 * its head before anything is unpacked; two are drawn at once, the others wait.
 */
export async function drawAnew(path: string, type: ImageType): Promise<Result<Buffer, BadImage>> {
  const size = await sizeOf(path);
  if (!size.ok) return size;
  if (size.value > MOST_PIXELS) return err({ kind: 'too-many-pixels' });
  await takeTurn();
  try {
    return ok(await FORMAT[type](opened(path).autoOrient()).timeout({ seconds: PATIENCE_S }).toBuffer());
  } catch {
    return err({ kind: 'unreadable' });
  } finally {
    giveTurn();
  }
}

const opened = (path: string): Sharp => sharp(path, { limitInputPixels: MOST_PIXELS, failOn: 'error', sequentialRead: true });

async function sizeOf(path: string): Promise<Result<number, BadImage>> {
  try {
    const { width, height } = await sharp(path, { limitInputPixels: false }).metadata();
    return ok(width * height);
  } catch {
    return err({ kind: 'unreadable' });
  }
}

let drawing = 0;
const waiting: (() => void)[] = [];

function takeTurn(): Promise<void> {
  if (drawing < AT_ONCE) {
    drawing += 1;
    return Promise.resolve();
  }
  return new Promise((resolve) => waiting.push(resolve));
}

/** The turn goes to who waits longest, or is free again. */
function giveTurn(): void {
  const next = waiting.shift();
  if (next === undefined) drawing -= 1;
  else next();
}
