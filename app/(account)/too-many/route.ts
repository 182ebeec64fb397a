import { words } from '@/lib/kernel/words';

const LONGEST_S = 86_400;

/**
 * Where a form ends that was sent too often: only a handler can answer with the status that says so. The seconds come from our own
 * redirect; somebody who changes them changes nothing but what they read.
 */
export function GET(request: Request): Response {
  const asked = Number(new URL(request.url).searchParams.get('s'));
  const seconds = Number.isInteger(asked) && asked > 0 ? Math.min(asked, LONGEST_S) : 60;
  return new Response(page(Math.ceil(seconds / 60)), {
    status: 429,
    headers: { 'content-type': 'text/html; charset=utf-8', 'retry-after': String(seconds), 'cache-control': 'private, no-store' },
  });
}

// Plain words without styles of the site: every value in them is our own.
function page(minutes: number): string {
  const title = words('accounts.tooMany.title');
  const parts = [words('accounts.tooMany.lead', { minutes }), words('accounts.tooMany.nothing')].map((text) => `<p>${text}</p>`);
  const links = `<p><a href="/sign-in">${words('accounts.tooMany.signIn')}</a> · <a href="/reset">${words('accounts.tooMany.reset')}</a></p>`;
  const look =
    ':root{color-scheme:light dark}body{max-width:38rem;margin:3rem auto;padding:0 1rem;font:1.125rem/1.6 Georgia,serif;' +
    'background:light-dark(#f2f4f1,#141817);color:light-dark(#1f2422,#e9eeeb)}a{color:light-dark(#1f4e7a,#97c2ec)}';
  return (
    `<!doctype html><html lang="en"><meta name="viewport" content="width=device-width,initial-scale=1"><title>${title} – Footring</title>` +
    `<style>${look}</style><main><h1>${title}</h1>${parts.join('')}${links}</main></html>`
  );
}
