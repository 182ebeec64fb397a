import { AsyncLocalStorage } from 'node:async_hooks';
import { Server, ServerResponse } from 'node:http';
import { retryAfterOf } from './unavailable';

type Emit = (this: Server, event: string | symbol, ...given: unknown[]) => boolean;
type WriteHead = (this: ServerResponse, status: number, ...rest: unknown[]) => unknown;
const isResponse = (value: unknown): value is ServerResponse => value instanceof ServerResponse;
const isEmit = (value: unknown): value is Emit => typeof value === 'function';
const isWriteHead = (value: unknown): value is WriteHead => typeof value === 'function';

const answered = new AsyncLocalStorage<ServerResponse>();
const waits = new WeakMap<ServerResponse, number>();

/** Remembers of the running request that its fault is one that waiting mends: a database that is away or too slow. */
export function noteUnavailable(error: unknown): void {
  const response = answered.getStore();
  const seconds = retryAfterOf(error);
  if (response !== undefined && seconds !== null) waits.set(response, seconds);
}

/**
 * Lets a page that could not be drawn for such a fault answer 503 and when to come back. Next has no status for that: what a page throws
 * becomes 500. Called once as the server starts.
 */
export function sayUnavailable(): void {
  const emit: unknown = Reflect.get(Server.prototype, 'emit');
  const writeHead: unknown = Reflect.get(ServerResponse.prototype, 'writeHead');
  if (!isEmit(emit) || !isWriteHead(writeHead)) return;
  const remembering: Emit = function (event, ...given) {
    const [, response] = given;
    if (event !== 'request' || !isResponse(response)) return emit.call(this, event, ...given);
    return answered.run(response, () => emit.call(this, event, ...given));
  };
  const saying: WriteHead = function (status, ...rest) {
    const seconds = status === 500 ? waits.get(this) : undefined;
    if (seconds === undefined) return writeHead.call(this, status, ...rest);
    this.setHeader('retry-after', String(seconds));
    return writeHead.call(this, 503, ...rest);
  };
  Reflect.set(Server.prototype, 'emit', remembering);
  Reflect.set(ServerResponse.prototype, 'writeHead', saying);
}
