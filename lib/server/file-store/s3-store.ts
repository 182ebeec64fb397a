import 'server-only';
import { Readable } from 'node:stream';
import type { S3Client } from '@aws-sdk/client-s3';
import type { S3Settings } from '../env';
import { webStreamOf } from './disk-store';
import { mustBeKey, type FileStore } from './file-store';
import { StoreFault } from './store-fault';

const CONNECT_MS = 2_000;
/** For putting an object and looking whether it is there whole. */
const PATIENCE_MS = 8_000;
const CHECK_MS = 2_000;

const nothing = (): void => undefined;
const SILENT = { trace: nothing, debug: nothing, info: nothing, warn: nothing, error: nothing };

// Loaded when it is first needed: who keeps files in a folder never pays for it.
const sdk = () => import('@aws-sdk/client-s3');

async function connect({ endpoint, region, key, secret }: S3Settings): Promise<S3Client> {
  const { S3Client } = await sdk();
  return new S3Client({
    region,
    ...(endpoint === null ? {} : { endpoint }),
    forcePathStyle: true,
    credentials: { accessKeyId: key, secretAccessKey: secret },
    // Other makers' stores do not know the newer checksums.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 2,
    logger: SILENT, // what fails is logged where it is turned into a refusal
    requestHandler: { connectionTimeout: CONNECT_MS, socketTimeout: PATIENCE_MS },
  });
}

/** Objects in a bucket that speaks S3. Its key and secret open nothing else, and nobody but this site opens the bucket. */
export function s3Store(settings: S3Settings): FileStore {
  let made: Promise<S3Client> | undefined;
  const client = (): Promise<S3Client> => (made ??= connect(settings));
  const at = (key: string) => ({ Bucket: settings.bucket, Key: mustBeKey(key) });
  return {
    put: (key, body, { type, bytes }) =>
      within(PATIENCE_MS, async (abortSignal) => {
        const { PutObjectCommand, HeadObjectCommand } = await sdk();
        const sent = { ...at(key), Body: Readable.from(body, { objectMode: false }), ContentLength: bytes, ContentType: type };
        await (await client()).send(new PutObjectCommand(sent), { abortSignal });
        // A store that says yes to half an object is not believed.
        const there = await (await client()).send(new HeadObjectCommand(at(key)), { abortSignal });
        if (there.ContentLength !== bytes) throw new Error(`Of ${bytes} bytes ${String(there.ContentLength)} are there`);
      }),
    read: (key) =>
      within(PATIENCE_MS, async (abortSignal) => {
        const { GetObjectCommand } = await sdk();
        const found = await (await client()).send(new GetObjectCommand(at(key)), { abortSignal }).catch(whereNone);
        return found?.Body instanceof Readable ? webStreamOf(found.Body) : null;
      }),
    remove: (key) =>
      within(PATIENCE_MS, async (abortSignal) => {
        const { DeleteObjectCommand } = await sdk();
        await (await client()).send(new DeleteObjectCommand(at(key)), { abortSignal }).catch(whereNone);
      }),
    check: () => isThere(client, settings.bucket),
  };
}

async function isThere(client: () => Promise<S3Client>, Bucket: string): Promise<boolean> {
  try {
    const { HeadBucketCommand } = await sdk();
    await within(CHECK_MS, async (abortSignal) => (await client()).send(new HeadBucketCommand({ Bucket }), { abortSignal }));
    return true;
  } catch (error) {
    if (error instanceof StoreFault) return false;
    throw error;
  }
}

/** Gives up after so many milliseconds. What fails is a fault of the store, whatever it was. */
async function within<T>(ms: number, work: (signal: AbortSignal) => Promise<T>): Promise<T> {
  const over = new AbortController();
  const timer = setTimeout(() => {
    over.abort();
  }, ms);
  try {
    return await work(over.signal);
  } catch (error) {
    throw new StoreFault(statusOf(error) === 507 ? 'store-full' : 'store-down', { cause: error });
  } finally {
    clearTimeout(timer);
  }
}

function whereNone(error: unknown): null {
  if (statusOf(error) === 404) return null;
  throw error;
}

function statusOf(error: unknown): number | null {
  if (!(error instanceof Error) || !('$metadata' in error)) return null;
  const { $metadata: told } = error;
  return typeof told === 'object' && told !== null && 'httpStatusCode' in told && typeof told.httpStatusCode === 'number'
    ? told.httpStatusCode
    : null;
}
