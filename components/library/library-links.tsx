import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

const PAGES = [
  ['changes', '/changes'],
  ['coverage', '/coverage'],
  ['limits', '/limits'],
  ['sources', '/sources'],
  ['heard', '/heard'],
  ['wishes', '/regions/wishes'],
] as const;

/** The other ways into the region sheets, each with what it is for. */
export function LibraryLinks(): ReactElement {
  return (
    <nav className="not-in-print mt-16" aria-labelledby="library">
      <h2 id="library">{words('library.links.title')}</h2>
      <ul className="mt-3 grid gap-x-8 lg:grid-cols-2">
        {PAGES.map(([page, href]) => (
          <li key={page} className="border-b border-rule py-3">
            <a className="font-strong" href={href}>
              {words(`library.links.${page}.name`)}
            </a>
            <p className="font-sans text-plain text-umber">{words(`library.links.${page}.about`)}</p>
          </li>
        ))}
      </ul>
    </nav>
  );
}
