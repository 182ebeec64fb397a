const HERE = 'http://here.invalid';
const LONGEST = 500;

/**
 * Where to go on after signing in: the path and query of an address on this site, or `otherwise` for everything else. The text
 * is read as a browser would read it, so that what looks like a path and leads elsewhere is seen through.
 */
export function nextPlace(text: unknown, otherwise: string): string {
  if (typeof text !== 'string' || !looksLikePath(text) || !URL.canParse(text, HERE)) return otherwise;
  const url = new URL(text, HERE);
  const path = url.pathname + url.search;
  return url.origin === HERE && !path.startsWith('//') && !hidesAnother(url.pathname) ? path : otherwise;
}

/** A browser drops tabs and line ends and reads a backslash as a slash; a path of ours holds neither. */
const looksLikePath = (text: string): boolean => text.length <= LONGEST && text.startsWith('/') && !/[\\\p{C}\s]/u.test(text);

/** `/%2f/elsewhere`, `/%5celsewhere`: harmless to us, but not to a front server that decodes before it passes on. */
const hidesAnother = (path: string): boolean => /^\/+(%2f|%5c|%09|%0a|%0d)/i.test(path);
