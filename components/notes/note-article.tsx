import type { ReactElement, ReactNode } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Heading, Note } from '@/lib/notes/domain/note';
import type { NumberedSource } from '@/lib/notes/domain/note-sources';
import type { WordEntry } from '@/lib/notes/domain/word';
import type { NamedRule } from '@/lib/regions/domain/heard-claim';
import { NoteSources } from './note-sources';

export type Titled = { readonly href: string; readonly title: string };

type Props = {
  readonly note: Note;
  readonly headings: readonly Heading[];
  readonly sources: readonly NumberedSource[];
  readonly rules: ReadonlyMap<string, NamedRule>;
  readonly terms: readonly WordEntry[];
  readonly places: readonly Titled[];
  readonly linkedFrom: readonly Titled[];
  readonly resting: readonly Titled[];
  readonly today: CalendarDate;
  /** The text itself, drawn. */
  readonly children: ReactNode;
};

/** Fewer headings than this are seen at a glance. */
const WORTH_A_LIST = 3;

/** A studio note: the short answer first, then the text, its sources, and what stands around it. */
export function NoteArticle(props: Props): ReactElement {
  const { note, headings, sources, rules, terms, places, linkedFrom, resting, today, children } = props;
  return (
    <article className="max-w-text">
      <p className="mb-2 font-sans text-plain text-umber">{words('notes.note.kind')}</p>
      <PageHeading>{note.title}</PageHeading>
      <div className="mt-4">
        <LookAgainLine by={note.lookAgainBy} today={today} />
      </div>
      <div className="mt-6">
        <Panel label={words('notes.note.short')}>
          <p>{note.summary}</p>
        </Panel>
      </div>
      <Places places={places} />
      {headings.length < WORTH_A_LIST ? null : <Contents headings={headings} />}
      <div className="prose note-text mt-8">{children}</div>
      <section className="mt-12" aria-labelledby="sources">
        <h2 id="sources">{words('notes.note.sources')}</h2>
        <p className="mt-2 mb-4 text-umber">{words(sources.length === 0 ? 'notes.note.noSources' : 'notes.note.sourcesLead')}</p>
        <NoteSources label={words('notes.note.sources')} sources={sources} rules={rules} />
      </section>
      <Resting rules={resting} />
      <Links
        id="words"
        title={words('notes.note.words')}
        links={terms.map(({ slug, name }) => ({ href: `/words/${slug}`, title: name }))}
      />
      <Links id="more" title={words('notes.note.more')} links={linkedFrom} />
      <p className="not-in-print mt-12">{words.rich('notes.note.wrong', { ask: (said) => <a href="/contact">{said}</a> })}</p>
      <p className="not-in-print mt-4">
        <a href="/notes">{words('notes.note.back')}</a>
      </p>
    </article>
  );
}

function LookAgainLine({ by, today }: { readonly by: CalendarDate; readonly today: CalendarDate }): ReactElement {
  const date = sayDate(by);
  if (by >= today) return <p className="font-sans text-small text-umber">{words('notes.note.lookAgain', { date })}</p>;
  return (
    <Panel colour="ash">
      <p className="font-sans text-plain">{words('notes.note.lookAgainPast', { date })}</p>
    </Panel>
  );
}

function Places({ places }: { readonly places: readonly Titled[] }): ReactElement | null {
  if (places.length === 0) return null;
  return (
    <div className="mt-4 font-sans text-plain">
      <p>{words('notes.note.places')}</p>
      <ul className="flex flex-wrap gap-x-4 gap-y-1" role="list">
        {places.map(({ href, title }) => (
          <li key={href}>
            <a href={href}>{title}</a>
          </li>
        ))}
      </ul>
    </div>
  );
}

function Contents({ headings }: { readonly headings: readonly Heading[] }): ReactElement {
  return (
    <nav className="not-in-print mt-6" aria-labelledby="contents">
      <h2 id="contents" className="text-read">
        {words('notes.note.contents')}
      </h2>
      <ul className="mt-2 list-disc ps-6">
        {headings.map(({ id, text }) => (
          <li key={id}>
            <a href={`#${id}`}>{text}</a>
          </li>
        ))}
      </ul>
    </nav>
  );
}

function Resting({ rules }: { readonly rules: readonly Titled[] }): ReactElement {
  return (
    <section className="mt-12" aria-labelledby="rests">
      <h2 id="rests">{words('notes.note.rests')}</h2>
      <p className="mt-2 text-umber">{words(rules.length === 0 ? 'notes.note.restsNone' : 'notes.note.restsLead')}</p>
      <LinkList links={rules} />
    </section>
  );
}

type LinksProps = { readonly id: string; readonly title: string; readonly links: readonly Titled[] };

/** A titled list of links; nothing where there are none. */
export function Links({ id, title, links }: LinksProps): ReactElement | null {
  if (links.length === 0) return null;
  return (
    <section className="mt-12" aria-labelledby={id}>
      <h2 id={id}>{title}</h2>
      <LinkList links={links} />
    </section>
  );
}

function LinkList({ links }: { readonly links: readonly Titled[] }): ReactElement | null {
  if (links.length === 0) return null;
  return (
    <ul className="mt-2 list-disc ps-6">
      {links.map(({ href, title }) => (
        <li key={href}>
          <a href={href}>{title}</a>
        </li>
      ))}
    </ul>
  );
}
