import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { SourceIndex } from '@/components/library/source-index';
import { SourceSearch } from '@/components/library/source-search';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { listSources, type ListedSources, type SourcesQuery } from '@/lib/regions/list-sources';
import { makeCtx } from '@/lib/server/ctx';

export const metadata: Metadata = { title: words('library.sources.title'), description: words('library.sources.description') };

type Given = Readonly<Record<string, string | string[] | undefined>>;
type Props = { readonly searchParams: Promise<Given> };

const LONGEST = 80;

/** What the address asks for. What makes no sense is as if it were not there. */
function queryOf(given: Given): SourcesQuery {
  const text = (name: string): string => {
    const value = given[name];
    return (typeof value === 'string' ? value : '').trim().slice(0, LONGEST);
  };
  const page = text('page');
  return { asked: text('q'), region: text('region') || null, rule: text('rule') || null, page: /^\d{1,4}$/.test(page) ? Number(page) : 1 };
}

export default async function SourcesPage({ searchParams }: Props): Promise<ReactElement> {
  const query = queryOf(await searchParams);
  const { asked, rule } = query;
  const sources = await listSources(makeCtx(), query);
  const { count, texts, narrowed } = sources;
  const isAll = [asked || null, rule, narrowed].every((part) => part === null);
  return (
    <>
      <PageHeading>{words('library.sources.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('library.sources.lead')}</p>
      <SourceSearch asked={asked} places={sources.places} chosen={narrowed?.code} />
      <p role="status" className="mt-4 font-sans text-plain">
        {words('library.sources.count', { count })}
      </p>
      {isAll ? null : (
        <p>
          <a href="/sources">{words('library.sources.showAll')}</a>
        </p>
      )}
      {count === 0 ? <p className="mt-4 max-w-text">{words('library.sources.none')}</p> : <SourceIndex texts={texts} />}
      <Pages sources={sources} query={{ q: asked, region: narrowed?.code ?? '', rule: rule ?? '' }} />
    </>
  );
}

type PagesProps = { readonly sources: ListedSources; readonly query: Readonly<Record<string, string>> };

function Pages({ sources: { page, pages }, query }: PagesProps): ReactElement | null {
  if (pages === 1) return null;
  const address = (number: number): string => {
    const kept = Object.entries(query).filter(([, value]) => value !== '');
    return `/sources?${new URLSearchParams([...kept, ['page', String(number)]]).toString()}`;
  };
  return (
    <nav className="not-in-print mt-6 flex flex-wrap gap-x-6 font-sans text-plain" aria-label={words('library.sources.pages')}>
      {page > 1 ? (
        <a className="inline-block py-2" rel="prev" href={address(page - 1)}>
          {words('library.sources.before')}
        </a>
      ) : null}
      <span className="py-2">{words('library.sources.page', { page, pages })}</span>
      {page < pages ? (
        <a className="inline-block py-2" rel="next" href={address(page + 1)}>
          {words('library.sources.next')}
        </a>
      ) : null}
    </nav>
  );
}
