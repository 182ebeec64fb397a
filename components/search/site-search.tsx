import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { words } from '@/lib/kernel/words';
import { SearchField } from './search-field';

/** The search of every page: a plain GET, with suggestions where there is script. */
export function SiteSearch(): ReactElement {
  return (
    <search className="site-search not-in-print" aria-label={words('search.field.short')}>
      <form action="/search" method="get">
        <label htmlFor="site-q" className="sr-only">
          {words('search.field.label')}
        </label>
        <SearchField id="site-q" asked="" />
        <Button kind="plain">{words('search.field.button')}</Button>
      </form>
    </search>
  );
}
