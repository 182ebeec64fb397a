import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache, type ReactElement } from 'react';
import { NoteArticle } from '@/components/notes/note-article';
import { noteComponents } from '@/components/notes/note-components';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { slug as slugShape } from '@/lib/kernel/shapes';
import { findRestingRules } from '@/lib/notes/find-resting-rules';
import { readNote, type ReadNote } from '@/lib/notes/read-note';
import type { NamedRule } from '@/lib/regions/domain/heard-claim';
import { listRegions } from '@/lib/regions/list-regions';
import { readRule } from '@/lib/regions/read-rule';
import { readConeCharts } from '@/lib/server/cone-charts';
import { makeCtx, type Ctx } from '@/lib/server/ctx';
import { compileNote } from '@/lib/server/note-body';

type Props = { readonly params: Promise<{ readonly slug: string }> };

const findNote = cache(async (slug: string): Promise<ReadNote | null> => {
  if (!slugShape.safeParse(slug).success) return null;
  const found = await readNote(slug);
  return found.ok ? found.value : null;
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const found = await findNote((await params).slug);
  return found === null ? {} : { title: found.note.title, description: found.note.summary };
}

/** The cited rules as their sheets have them in use; a withdrawn one is left out. */
async function rulesOf(ctx: Ctx, { sources }: ReadNote): Promise<ReadonlyMap<string, NamedRule>> {
  const ids = sources.flatMap((source) => (source.kind === 'rule' ? source.ids : []));
  const read = await Promise.all(ids.map((id) => readRule(ctx, id)));
  return new Map(
    read.flatMap((one): readonly [string, NamedRule][] => {
      if (!one.ok || one.value.withdrawn) return [];
      const { rule, sheet } = one.value;
      const { id, title, strength, standing, evidence } = rule;
      return [[id, { id, title, strength, standing, evidence, place: sheet.name, source: rule.sources[0]?.title ?? null }]];
    }),
  );
}

export default async function NotePage({ params }: Props): Promise<ReactElement> {
  const found = await findNote((await params).slug);
  if (found === null) notFound();
  const ctx = makeCtx();
  const { note, sources } = found;
  const facts = sources.flatMap((source) => (source.kind === 'text' ? source.ids : []));
  const [rules, resting, regions, charts, Text] = await Promise.all([
    rulesOf(ctx, found),
    findRestingRules(ctx, facts),
    listRegions(ctx),
    readConeCharts(),
    compileNote(note.body),
  ]);
  return (
    <NoteArticle
      note={note}
      headings={found.headings}
      sources={sources}
      rules={rules}
      terms={found.words}
      places={regions.filter(({ code }) => note.places.includes(code)).map(({ code, name }) => ({ href: `/regions/${code}`, title: name }))}
      linkedFrom={found.linkedFrom.map(({ slug, title }) => ({ href: `/notes/${slug}`, title }))}
      resting={resting.map(({ id, title }) => ({ href: `/rules/${id}`, title }))}
      today={calendarDateOf(ctx.now)}
    >
      <Text components={noteComponents({ sources, rules, charts })} />
    </NoteArticle>
  );
}
