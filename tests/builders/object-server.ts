import { createServer, type IncomingMessage, type ServerResponse } from 'node:http';
import type { AddressInfo } from 'node:net';
import type { S3Settings } from '@/lib/server/env';

/**
 * `well`: keeps what is put. `down`: hears and never answers. `slow`: answers after a second. `broken`: 500 to everything. `full`: 507 to
 * what is put. `cut`: breaks the line in the middle of a body. `lying`: says yes and keeps the first half.
 */
export type Mood = 'well' | 'down' | 'slow' | 'broken' | 'full' | 'cut' | 'lying';

export type ObjectServer = {
  readonly settings: S3Settings;
  readonly objects: ReadonlyMap<string, Buffer>;
  /** Requests that came without a signature of ours over the head. */
  readonly unsigned: readonly string[];
  readonly feel: (mood: Mood) => void;
  readonly end: () => Promise<void>;
};

const KEY = 'potshop-key';
const SIGNED = new RegExp(
  `^AWS4-HMAC-SHA256 Credential=${KEY}/\\d{8}/us-east-1/s3/aws4_request, ?SignedHeaders=[a-z0-9;-]*host[a-z0-9;-]*, ?Signature=[0-9a-f]{64}$`,
);

async function bodyOf(request: IncomingMessage): Promise<Buffer> {
  const parts: Buffer[] = [];
  for await (const part of request) parts.push(part as Buffer);
  return Buffer.concat(parts);
}

/** A store of objects that speaks as much S3 as is asked of it here, and behaves as badly as it is told. */
export async function startObjectServer(): Promise<ObjectServer> {
  const objects = new Map<string, Buffer>();
  const unsigned: string[] = [];
  let mood: Mood = 'well';

  const put = async (place: string, request: IncomingMessage, answer: ServerResponse): Promise<void> => {
    if (mood === 'cut') {
      request.once('data', () => request.socket.destroy());
      return;
    }
    const body = await bodyOf(request);
    if (mood === 'full') {
      answer.writeHead(507).end();
      return;
    }
    objects.set(place, mood === 'lying' ? body.subarray(0, body.length / 2) : body);
    answer.writeHead(200, { etag: '"x"' }).end();
  };

  const get = (place: string, isHead: boolean, answer: ServerResponse): void => {
    const found = objects.get(place);
    if (found === undefined) {
      answer.writeHead(/^\/potshop\/?$/.test(place) ? 200 : 404).end();
      return;
    }
    answer.writeHead(200, { 'content-length': found.length, etag: '"x"' });
    if (isHead) answer.end();
    else if (mood === 'cut') answer.write(found.subarray(0, found.length / 2), () => answer.destroy());
    else answer.end(found);
  };

  const handle = async (request: IncomingMessage, answer: ServerResponse): Promise<void> => {
    const place = new URL(request.url ?? '/', 'http://x').pathname;
    if (!SIGNED.test(request.headers.authorization ?? '')) unsigned.push(`${request.method ?? ''} ${place}`);
    if (mood === 'down') return;
    if (mood === 'broken') {
      answer.writeHead(500).end();
      return;
    }
    if (mood === 'slow') await new Promise((resolve) => setTimeout(resolve, 1_000));
    if (request.method === 'PUT') await put(place, request, answer);
    else if (request.method === 'DELETE') {
      objects.delete(place);
      answer.writeHead(204).end();
    } else get(place, request.method === 'HEAD', answer);
  };

  const server = createServer((request, answer) => {
    request.on('error', () => undefined);
    handle(request, answer).catch(() => answer.destroy());
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const endpoint = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;
  return {
    settings: { endpoint, region: 'us-east-1', bucket: 'potshop', key: KEY, secret: 'potshop-secret' },
    objects,
    unsigned,
    feel: (next) => {
      mood = next;
    },
    end: () =>
      new Promise((resolve) => {
        server.close(() => {
          resolve();
        });
        server.closeAllConnections();
      }),
  };
}
