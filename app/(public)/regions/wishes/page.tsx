import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { WishForm } from '@/components/library/wish-form';
import { ErrorSummary } from '@/components/ui/error-summary';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { LOCALE, words } from '@/lib/kernel/words';
import { listWishes, type WishedCountry } from '@/lib/regions/list-wishes';
import { makeCtx } from '@/lib/server/ctx';
import { wish } from './actions';

export const metadata: Metadata = { title: words('library.wish.title'), description: words('library.wish.description') };

type Props = { readonly searchParams: Promise<Record<string, string | string[] | undefined>> };

const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });
const REFUSALS = ['no-such-country', 'too-many'] as const;

export default async function WishesPage({ searchParams }: Props): Promise<ReactElement> {
  const { asked, why } = await searchParams;
  const countries = await listWishes(makeCtx());
  const refusal = REFUSALS.find((one) => one === why);
  const error = refusal === undefined ? undefined : words(`library.wish.refused.${refusal}`);
  const chosen = countries.find(({ code }) => code === asked);
  return (
    <>
      {error === undefined ? null : (
        <ErrorSummary heading={words('library.wish.again')} faults={[{ id: 'region', said: error }]} tries={1} />
      )}
      <PageHeading>{words('library.wish.title')}</PageHeading>
      {error === undefined && chosen !== undefined ? <Thanks country={chosen} /> : null}
      <p className="mt-4 max-w-text">{words('library.wish.lead')}</p>
      <div className="mt-6">
        <WishForm
          countries={countries.toSorted((a, b) => BY_NAME.compare(a.name, b.name))}
          chosen={error === undefined ? undefined : chosen?.code}
          error={error}
          act={wish}
        />
      </div>
      <Counted countries={countries} />
      <p className="mt-8">
        <a href="/regions">{words('coverage.find')}</a>
      </p>
    </>
  );
}

function Thanks({ country: { name, count } }: { readonly country: WishedCountry }): ReactElement {
  return (
    <div className="mt-4 max-w-text" role="status">
      <Panel colour="celadon">
        <p>{words('library.wish.thanks', { name })}</p>
        <p>{words('library.wish.count', { count })}</p>
      </Panel>
    </div>
  );
}

const SHOWN = 30;

function Counted({ countries }: { readonly countries: readonly WishedCountry[] }): ReactElement {
  const wanted = countries.filter(({ count }) => count > 0).slice(0, SHOWN);
  return (
    <section className="mt-12 max-w-text" aria-labelledby="counted">
      <h2 id="counted">{words('library.wish.counted')}</h2>
      {wanted.length === 0 ? <p className="mt-2">{words('library.wish.nobody')}</p> : null}
      <ul className="mt-2 ms-6 list-disc">
        {wanted.map(({ code, name, count }) => (
          <li key={code}>{words('library.wish.of', { name, count })}</li>
        ))}
      </ul>
    </section>
  );
}
