import { NextResponse, type NextRequest } from 'next/server';
import broken from '@/content/messages/en/broken.json';
import { ownOrigin } from '@/lib/server/own-site';

/** As `bodySizeLimit` in next.config.mjs: over it an action is never called, and Next would answer with bare text. */
const LARGEST = 2 * 1024 * 1024;

const policy = (nonce: string): string =>
  [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'`,
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data:",
    "font-src 'self'",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');

function refuse(status: number, said: string): NextResponse {
  const { title, titleOf } = broken.refused;
  return new NextResponse(`<!doctype html><html lang="en"><title>${titleOf}</title><h1>${title}</h1><p>${said}</p></html>`, {
    status,
    headers: { 'content-type': 'text/html; charset=utf-8', 'content-security-policy': "default-src 'none'; frame-ancestors 'none'" },
  });
}

const isTooLarge = (request: NextRequest): boolean => !(Number(request.headers.get('content-length') ?? Number.NaN) <= LARGEST);

/** The host that Next holds the origin against, and breaks off with 500 when it is another. */
function namesUs(request: NextRequest): boolean {
  const named = request.headers.get('x-forwarded-host') ?? request.headers.get('host') ?? '';
  return named.split(',')[0]?.trim() === new URL(ownOrigin()).host;
}

/** Says in words what Next would answer with bare text. Protects nothing: every action asks again for itself. */
function refusalOf(request: NextRequest): NextResponse | null {
  if (request.method === 'GET' || request.method === 'HEAD') return null;
  if (request.headers.get('origin') !== ownOrigin()) return refuse(403, broken.refused.origin);
  if (!namesUs(request)) return refuse(421, broken.refused.host);
  return isTooLarge(request) ? refuse(413, broken.refused.size) : null;
}

/** Gives each page its script nonce, and the layout the address it is drawn for. */
export function proxy(request: NextRequest): NextResponse {
  const refusal = refusalOf(request);
  if (refusal !== null) return refusal;
  const said = policy(Buffer.from(crypto.getRandomValues(new Uint8Array(16))).toString('base64'));
  const headers = new Headers(request.headers);
  headers.set('content-security-policy', said); // Next takes the nonce for its own scripts from here.
  headers.set('x-path', request.nextUrl.pathname);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', said);
  if (ownOrigin().startsWith('https:')) response.headers.set('strict-transport-security', 'max-age=63072000; includeSubDomains');
  return response;
}

// `rsc` answers are data for a page that has its policy already; /api sets its own headers and takes larger bodies.
export const config = { matcher: [{ source: '/((?!_next/static/|api/).*)', missing: [{ type: 'header', key: 'rsc' }] }] };
