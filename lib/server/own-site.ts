import { env } from './env';

/** Where this site says it is reached, as an Origin header names it. Whatever a request claims about that is not asked. */
export const ownOrigin = (): string => env.site;

/** The path of an address on this site, to go back to; the first page for any other address, and for none. */
export function samePlace(address: string | null): string {
  if (address === null || !URL.canParse(address)) return '/';
  const url = new URL(address);
  return url.origin === ownOrigin() && !url.pathname.startsWith('//') ? url.pathname + url.search : '/';
}
