import type { ReactElement } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly asked: string;
  /** The question as it was understood. */
  readonly read: string;
  readonly nearest: readonly string[];
  /** Countries without a sheet that go by the name asked for. */
  readonly without: readonly string[];
  readonly isNarrowed: boolean;
};

const searchFor = (asked: string): string => `/search?${new URLSearchParams({ q: asked }).toString()}`;

/** No answer: how the question was read, what that does not mean, words near to it, and whom to ask. */
export function NothingFound({ asked, read, nearest, without, isNarrowed }: Props): ReactElement {
  return (
    <section className="mt-8 flex max-w-text flex-col gap-4" aria-labelledby="nothing-found">
      <h2 id="nothing-found">{words('search.none.title')}</h2>
      {read === asked.toLowerCase() || read === '' ? null : <p>{words('search.none.read', { asked, read })}</p>}
      <p>{words('search.none.meaning')}</p>
      {without.map((name) => (
        <p key={name}>{words('search.none.without', { name })}</p>
      ))}
      {nearest.length === 0 ? null : (
        <div>
          <p>{words('search.none.nearest')}</p>
          <ul className="ms-6 list-disc">
            {nearest.map((word) => (
              <li key={word}>
                <a href={searchFor(word)}>{word}</a>
              </li>
            ))}
          </ul>
        </div>
      )}
      {isNarrowed ? (
        <p>
          <a href={searchFor(asked)}>{words('search.none.filters')}</a>
        </p>
      ) : null}
      <p>
        <LinkButton kind="plain" href="/regions/wishes">
          {words('search.none.editor')}
        </LinkButton>
      </p>
      <Elsewhere />
    </section>
  );
}

/** Lists that can be read without a question. */
export function Elsewhere(): ReactElement {
  const links = [
    ['/notes', words('search.none.notes')],
    ['/words', words('search.none.words')],
    ['/regions', words('search.none.regions')],
    ['/contact', words('search.none.ask')],
  ] as const;
  return (
    <ul className="ms-6 list-disc">
      {links.map(([href, label]) => (
        <li key={href}>
          <a href={href}>{label}</a>
        </li>
      ))}
    </ul>
  );
}
