import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { HitList } from '@/components/search/hit-list';
import { Elsewhere, NothingFound } from '@/components/search/nothing-found';
import { SearchForm } from '@/components/search/search-form';
import { PageHeading } from '@/components/ui/page-heading';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { findRegions } from '@/lib/regions/find-regions';
import { isSearchKind } from '@/lib/search/domain/entry';
import { LONGEST_QUERY } from '@/lib/search/domain/query';
import { listPlaces, type SearchPlace } from '@/lib/search/list-places';
import { MOST_FOUND, PAGE, type SearchQuery } from '@/lib/search/schema';
import { searchPages, type Found } from '@/lib/search/search-pages';
import { takeApiCall } from '@/lib/server/api-limit';
import { clientAddress } from '@/lib/server/client-address';
import { makeCtx } from '@/lib/server/ctx';

type Given = Record<string, string | string[] | undefined>;
type Props = { readonly searchParams: Promise<Given> };

const textOf = (given: Given, name: string): string => {
  const value = given[name];
  return (typeof value === 'string' ? value : '').trim();
};

export async function generateMetadata({ searchParams }: Props): Promise<Metadata> {
  const asked = textOf(await searchParams, 'q').slice(0, LONGEST_QUERY);
  const title = asked === '' ? words('search.title') : words('search.titleOf', { asked });
  return { title, description: words('search.description'), robots: asked === '' ? {} : { index: false } };
}

/** The question in the address; what is no kind, place or page there narrows nothing. */
function readQuestion(given: Given, places: readonly SearchPlace[]): SearchQuery & { readonly page: number } {
  const [kind, region, number] = [textOf(given, 'kind'), textOf(given, 'region'), textOf(given, 'page')];
  const page = Math.min(Math.max(1, /^\d{1,3}$/.test(number) ? Number(number) : 1), MOST_FOUND / PAGE);
  return {
    q: textOf(given, 'q').slice(0, LONGEST_QUERY),
    kind: isSearchKind(kind) ? kind : null,
    region: places.some(({ code }) => code === region) ? region : null,
    page,
    offset: (page - 1) * PAGE,
    limit: PAGE,
  };
}

export default async function SearchPage({ searchParams }: Props): Promise<ReactElement> {
  const given = await searchParams;
  const ctx = makeCtx();
  const places = await listPlaces(ctx);
  const question = readQuestion(given, places);
  const isCut = textOf(given, 'q').length > LONGEST_QUERY;
  return (
    <>
      <PageHeading>{words('search.title')}</PageHeading>
      <p className="mt-4 max-w-text">{words('search.lead')}</p>
      <SearchForm asked={question.q} kind={question.kind} region={question.region} places={places} />
      {isCut ? <p className="mt-4 font-sans text-plain">{words('search.cut', { most: LONGEST_QUERY })}</p> : null}
      {question.q === '' ? <Start /> : <Answers question={question} places={places} />}
    </>
  );
}

function Start(): ReactElement {
  return (
    <section className="mt-8" aria-labelledby="can-be-found">
      <h2 id="can-be-found">{words('search.start.title')}</h2>
      <div className="mt-4">
        <Elsewhere />
      </div>
    </section>
  );
}

type AnswersProps = { readonly question: SearchQuery & { readonly page: number }; readonly places: readonly SearchPlace[] };

async function Answers({ question, places }: AnswersProps): Promise<ReactElement> {
  const ctx = makeCtx();
  const taken = await takeApiCall(await clientAddress(), ctx);
  if (!taken.ok) return <p className="mt-6">{words('search.start.tooMany', { seconds: taken.error.retryAfterS })}</p>;
  const found = await searchPages(ctx, question);
  const { q, region, kind } = question;
  const placeName = places.find(({ code }) => code === region)?.name ?? null;
  const without = found.count > 0 ? [] : (await findRegions(ctx, q.slice(0, 80))).without.map(({ name }) => name);
  return (
    <>
      <p role="status" className="mt-6 font-sans text-plain">
        {words(found.isMore ? 'search.countMost' : 'search.count', { count: found.count, asked: q })}
      </p>
      {found.query.mended.map((mended) => (
        <p key={mended.from} className="mt-2 font-sans text-plain">
          {words('search.mended', mended)}
        </p>
      ))}
      {found.count === 0 ? (
        <NothingFound
          asked={q}
          read={found.query.read}
          nearest={found.nearest}
          without={without}
          isNarrowed={kind !== null || region !== null}
        />
      ) : (
        <HitList hits={found.hits} today={calendarDateOf(ctx.now)} placeName={placeName} />
      )}
      <Pages question={question} found={found} />
    </>
  );
}

function Pages({
  question: { q, kind, region, page },
  found,
}: Pick<AnswersProps, 'question'> & { readonly found: Found }): ReactElement | null {
  const pages = Math.max(1, Math.ceil(found.count / PAGE));
  if (pages === 1) return null;
  const address = (number: number): string => {
    const kept = Object.entries({ q, kind: kind ?? '', region: region ?? '' }).filter(([, value]) => value !== '');
    return `/search?${new URLSearchParams([...kept, ['page', String(number)]]).toString()}`;
  };
  return (
    <nav className="not-in-print mt-6 flex flex-wrap gap-x-6 font-sans text-plain" aria-label={words('search.pages.label')}>
      {page > 1 ? (
        <a className="inline-block py-2" rel="prev" href={address(page - 1)}>
          {words('search.pages.before')}
        </a>
      ) : null}
      <span className="py-2">{words('search.pages.page', { page, pages })}</span>
      {page < pages ? (
        <a className="inline-block py-2" rel="next" href={address(page + 1)}>
          {words('search.pages.next')}
        </a>
      ) : null}
    </nav>
  );
}
