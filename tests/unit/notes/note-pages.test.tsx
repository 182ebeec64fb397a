import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { NoteArticle } from '@/components/notes/note-article';
import { noteComponents } from '@/components/notes/note-components';
import { DRAWINGS, NoteDrawing } from '@/components/notes/note-drawing';
import { parseCalendarDate } from '@/lib/kernel/calendar-date';
import { readNote } from '@/lib/notes/read-note';
import type { NamedRule } from '@/lib/regions/domain/heard-claim';
import { evidenceOf } from '@/lib/regions/domain/told-rule';
import { readConeCharts } from '@/lib/server/cone-charts';
import { compileNote } from '@/lib/server/note-body';
import { seedSheets } from '../../builders/seed-sheets';
import { SHIPPED } from './shipped-notes';

const rules: ReadonlyMap<string, NamedRule> = new Map(
  [...seedSheets.values()].flatMap((sheet) =>
    sheet.rules.map((rule): [string, NamedRule] => {
      const { id, title, strength, standing } = rule;
      const source = sheet.sources.find((one) => one.id === rule.sources[0]?.source)?.title ?? null;
      return [id, { id, title, strength, standing, evidence: evidenceOf(rule), place: sheet.name, source }];
    }),
  ),
);

async function drawn(slug: string, on = '2026-12-01'): Promise<string> {
  const [read, charts] = await Promise.all([readNote(slug), readConeCharts()]);
  const today = parseCalendarDate(on);
  if (!read.ok || today === null) throw new Error(slug);
  const { note, headings, sources, words, linkedFrom } = read.value;
  const Text = await compileNote(note.body);
  return renderToStaticMarkup(
    <NoteArticle
      note={note}
      headings={headings}
      sources={sources}
      rules={rules}
      terms={words}
      places={[]}
      linkedFrom={linkedFrom.map((one) => ({ href: `/notes/${one.slug}`, title: one.title }))}
      resting={[]}
      today={today}
    >
      <Text components={noteComponents({ sources, rules, charts })} />
    </NoteArticle>,
  );
}

test.each(SHIPPED.map(({ slug }) => [slug]))(
  'NOTE-3 NOTE-5 %s is drawn, and each of its numbers and headings leads to its place',
  async (slug) => {
    const html = await drawn(slug);
    const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    const asked = [...html.matchAll(/href="#([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(ids).size).toBe(ids.length);
    expect(asked.length).toBeGreaterThan(3);
    expect(asked.filter((id) => !ids.includes(id))).toEqual([]);
    expect(html).not.toMatch(/\[object|undefined|<Fact|<Rule/);
    expect(html.match(/<h1/g)).toHaveLength(1);
  },
);

test('NOTE-4 a figure from memory, talk of the trade and a weak copy are marked beside the figure', async () => {
  expect(await drawn('cones-and-the-1000-degree-line')).toMatch(/998 °C[^.]*<sup class="cite"><a[^>]*>\d+, from memory<\/a>/);
  expect(await drawn('planning-tests')).toMatch(/is said for one design\u00a0<sup class="cite"><a[^>]*>\d+, trade talk<\/a>/);
  expect(await drawn('crazing-and-crackle')).toMatch(/unfit for food\u00a0<sup class="cite"><a[^>]*>\d+, weak copy<\/a>/);
  expect(await drawn('leach-test')).toMatch(/24 hours at 22 °C\u00a0<sup class="cite"><a[^>]*>\d+<\/a>/);
});

test('NOTE-1 past its day, a note says so above its text; before it, it names the day', async () => {
  expect(await drawn('lead', '2027-12-01')).toContain('To be looked at again by 1 December 2027.');
  const late = await drawn('lead', '2027-12-02');
  expect(late.indexOf('Not looked at again since 1 December 2027')).toBeGreaterThan(0);
  expect(late.indexOf('Not looked at again since')).toBeLessThan(late.indexOf('The short answer'));
});

test('NOTE-3 a withdrawn rule keeps its number and says that it is gone', async () => {
  const read = await readNote('selling-at-a-stall');
  if (!read.ok) throw new Error('selling-at-a-stall');
  const Text = await compileNote(read.value.note.body);
  const html = renderToStaticMarkup(<Text components={noteComponents({ sources: read.value.sources, rules: new Map(), charts: [] })} />);
  expect(html).toContain('href="#source-1"');
});

test.each(DRAWINGS.map((name) => [name]))('NOTE-8 the drawing "%s" has a title, a description and its twin in words', async (name) => {
  const html = renderToStaticMarkup(<NoteDrawing of={name} charts={await readConeCharts()} />);
  const title = /<title id="([^"]+)">([^<]+)<\/title>/.exec(html);
  const about = /<desc id="([^"]+)">([^<]+)<\/desc>/.exec(html);
  expect(html).toContain(`role="img" aria-labelledby="${title?.[1] ?? 'none'} ${about?.[1] ?? 'none'}"`);
  const twin = /<figcaption>([\s\S]*)<\/figcaption>/.exec(html)?.[1] ?? '';
  expect(twin).toContain(title?.[2] ?? 'no title');
  expect(twin).toContain(about?.[2] ?? 'no words');
  expect(html).not.toContain('NaN');
});

test('NOTE-8 the chart of cones has a point for every whole cone of both speeds, hollow where it is from memory', async () => {
  const html = renderToStaticMarkup(<NoteDrawing of="cone-chart" charts={await readConeCharts()} />);
  // 010 to 01 and 1 to 10 at each of two speeds, and one of each kind for the legend.
  expect(html.match(/<circle[^>]*r="3.2"/g)).toHaveLength(21);
  expect(html.match(/<circle[^>]*fill-bisque/g)?.length).toBeGreaterThan(10);
});
