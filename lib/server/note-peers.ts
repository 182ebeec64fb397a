import { Server, type IncomingMessage } from 'node:http';

/** Set by us on every request that reaches this process, whatever the client sent under this name. */
export const PEER_HEADER = 'x-footring-peer';

type Emit = (this: Server, event: string | symbol, ...given: unknown[]) => boolean;
const isEmit = (value: unknown): value is Emit => typeof value === 'function';
const isRequest = (value: unknown): value is IncomingMessage => value instanceof Object && 'socket' in value && 'headers' in value;

/**
 * Writes the address of the socket into each request. Next gives pages and handlers no socket, and believes an X-Forwarded-For that
 * anybody may send. Called once as the server starts.
 */
export function notePeers(): void {
  const original: unknown = Reflect.get(Server.prototype, 'emit');
  if (!isEmit(original)) return;
  const noting: Emit = function (event, ...given) {
    const [request] = given;
    if (event === 'request' && isRequest(request)) request.headers[PEER_HEADER] = request.socket.remoteAddress ?? '';
    return original.call(this, event, ...given);
  };
  Reflect.set(Server.prototype, 'emit', noting);
}
