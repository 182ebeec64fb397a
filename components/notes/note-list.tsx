import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { controlProps, Field } from '@/components/ui/field';
import { words } from '@/lib/kernel/words';
import { NOTE_TOPICS, type Note } from '@/lib/notes/domain/note';

/** All notes under their first topic, each with its short answer. */
export function NoteList({ notes }: { readonly notes: readonly Note[] }): ReactElement {
  const topics = NOTE_TOPICS.map((topic) => ({ topic, notes: notes.filter(({ topics: [first] }) => first === topic) }));
  const shown = topics.filter((one) => one.notes.length > 0);
  return (
    <>
      <nav className="not-in-print mt-8" aria-labelledby="topics">
        <h2 id="topics" className="text-read">
          {words('notes.contents')}
        </h2>
        <ul className="mt-2 flex flex-wrap gap-x-6 gap-y-2" role="list">
          {shown.map(({ topic }) => (
            <li key={topic}>
              <a href={`#${topic}`}>{words(`notes.topics.${topic}`)}</a>
            </li>
          ))}
        </ul>
      </nav>
      {shown.map((one) => (
        <section key={one.topic} className="mt-12" aria-labelledby={one.topic}>
          <h2 id={one.topic}>{words(`notes.topics.${one.topic}`)}</h2>
          <ul className="mt-3 flex flex-col gap-6" role="list">
            {one.notes.map(({ slug, title, summary }) => (
              <li key={slug} className="keep-together">
                <h3 className="text-read">
                  <a href={`/notes/${slug}`}>{title}</a>
                </h3>
                <p>{summary}</p>
              </li>
            ))}
          </ul>
        </section>
      ))}
    </>
  );
}

/** Looks through notes, rules and words: a plain GET, so that the answer has an address. */
export function NoteFinder(): ReactElement {
  const said = { label: words('notes.find.label'), hint: words('notes.find.hint') };
  return (
    <search>
      <form action="/search" method="get">
        <Field id="note-query" {...said}>
          <div className="flex flex-wrap gap-3">
            <input className="control" type="search" name="q" autoComplete="off" maxLength={200} {...controlProps('note-query', said)} />
            <Button kind="plain">{words('notes.find.button')}</Button>
          </div>
        </Field>
      </form>
    </search>
  );
}
