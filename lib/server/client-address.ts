import 'server-only';
import { isIP, isIPv6 } from 'node:net';
import { headers } from 'next/headers';
import { readEnv } from './env';
import { PEER_HEADER } from './note-peers';

/** The address the running request came from, trimmed to what limits need: see `addressIn`. */
export async function clientAddress(): Promise<string> {
  return addressIn(await headers(), readEnv().proxies);
}

const NOWHERE = 'unknown';

/**
 * Where a request came from. X-Forwarded-For is believed only as far as the proxies named in the settings wrote it: read from its
 * end, the first address that is none of them. Of IPv6 the first 64 bits are kept, since one household has all the others.
 */
export function addressIn(asked: Headers, proxies: readonly string[]): string {
  let from = plain(asked.get(PEER_HEADER) ?? '');
  const told = (asked.get('x-forwarded-for') ?? '').split(',').map(plain).slice(-50);
  while (proxies.includes(from)) {
    const next = told.pop();
    if (next === undefined || isIP(next) === 0) break;
    from = next;
  }
  return isIP(from) === 0 ? NOWHERE : trimmed(from);
}

/** An IPv4 address in its own form, also when a socket for both kinds writes it as `::ffff:192.0.2.1`. */
function plain(address: string): string {
  return address
    .trim()
    .toLowerCase()
    .replace(/^::ffff:(?=\d+\.)/, '');
}

function trimmed(address: string): string {
  if (!isIPv6(address)) return address;
  // The URL parser writes every IPv6 address in one form, in hexadecimal alone.
  const written = new URL(`http://[${address.replace(/%.*$/, '')}]`).hostname.slice(1, -1);
  const [front = '', back] = written.split('::');
  const groups = front === '' ? [] : front.split(':');
  const behind = back === undefined || back === '' ? [] : back.split(':');
  const between = Array.from({ length: 8 - groups.length - behind.length }, () => '0');
  return [...[...groups, ...between, ...behind].slice(0, 4), ''].join(':').concat(':/64');
}
