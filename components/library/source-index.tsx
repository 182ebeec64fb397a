import type { ReactElement } from 'react';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { readingOf, type CitedText, type Reading } from '@/lib/regions/domain/cited-text';

/** Texts, each with its publisher, the sheets that name it, how much rests on it, and whether it was read. */
export function SourceIndex({ texts }: { readonly texts: readonly CitedText[] }): ReactElement {
  return (
    <ul className="mt-4 max-w-text">
      {texts.map((text) => (
        <li key={text.address} className="border-b border-rule py-3 wrap-anywhere">
          <a href={`/sources/${text.address}`}>
            <cite>{text.source.title}</cite>
          </a>
          <ul className="flex flex-wrap gap-x-4 font-sans text-plain text-umber">
            <li>
              <bdi>{text.source.publisher}</bdi>
            </li>
            <li>{sayList(text.places.map(({ name }) => name))}</li>
            <li>{words('library.sources.rests', { count: text.resting.length })}</li>
            <li>
              <SaidReading reading={readingOf(text)} />
            </li>
          </ul>
        </li>
      ))}
    </ul>
  );
}

/** "read on 1 December 2026", or plainly that nobody of us read it. */
export function SaidReading({ reading: { state, on } }: { readonly reading: Reading }): ReactElement {
  if (state === 'not-read') return <strong className="font-strong text-ash">{words('library.sources.notRead')}</strong>;
  if (on === null) return <>{words('library.sources.readSometime')}</>;
  return <>{words.rich('regions.source.seen', { date: sayDate(on), day: (said) => <time dateTime={on}>{said}</time> })}</>;
}
