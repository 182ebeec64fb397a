import type { ReactElement } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { byLetter, type WordEntry } from '@/lib/notes/domain/word';
import { Links, type Titled } from './note-article';

/** The word list by letters. */
export function WordList({ entries }: { readonly entries: readonly WordEntry[] }): ReactElement {
  const letters = byLetter(entries);
  return (
    <>
      <nav className="not-in-print mt-6" aria-label={words('notes.words.letters')}>
        <ul className="word-letters" role="list">
          {letters.map(({ letter }) => (
            <li key={letter}>
              <a href={`#letter-${letter}`}>{letter}</a>
            </li>
          ))}
        </ul>
      </nav>
      {letters.map((group) => (
        <section key={group.letter} className="mt-8" aria-labelledby={`letter-${group.letter}`}>
          <h2 id={`letter-${group.letter}`} className="text-lead">
            {group.letter}
          </h2>
          <dl className="mt-2 flex flex-col gap-3">
            {group.entries.map(({ slug, name, definition }) => (
              <div key={slug} className="keep-together">
                <dt className="font-strong">
                  <a href={`/words/${slug}`}>{name}</a>
                </dt>
                <dd>{definition}</dd>
              </div>
            ))}
          </dl>
        </section>
      ))}
    </>
  );
}

type PageProps = { readonly word: WordEntry; readonly see: readonly WordEntry[]; readonly notes: readonly Titled[] };

const LANGUAGES = ['en', 'de', 'da', 'fr'] as const;

/** One word: what it means, what else it is called, and where it is used. */
export function WordPage({ word, see, notes }: PageProps): ReactElement {
  const said = LANGUAGES.filter((language) => word.also[language] !== undefined);
  return (
    <article className="max-w-text">
      <p className="mb-2 font-sans text-plain text-umber">{words('notes.words.kind')}</p>
      <PageHeading>{word.name}</PageHeading>
      <p className="mt-4">{word.definition}</p>
      <section className="mt-8" aria-labelledby="also">
        <h2 id="also" className="text-lead">
          {words('notes.words.also')}
        </h2>
        <dl className="word-also mt-2">
          {said.map((language) => (
            <div key={language}>
              <dt>{words(`notes.words.languages.${language}`)}</dt>
              <dd lang={language}>{(word.also[language] ?? []).join(', ')}</dd>
            </div>
          ))}
        </dl>
      </section>
      <Links id="see" title={words('notes.words.see')} links={see.map(({ slug, name }) => ({ href: `/words/${slug}`, title: name }))} />
      <Links id="notes" title={words('notes.words.notes')} links={notes} />
      <p className="not-in-print mt-12">
        <a href="/words">{words('notes.words.back')}</a>
      </p>
    </article>
  );
}
