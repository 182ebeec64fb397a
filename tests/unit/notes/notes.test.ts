import { expect, test } from 'vitest';
import allowed from '@/content/words/allowed.json';
import sources from '@/content/notes/fact-sources.json';
import { DRAWINGS } from '@/components/notes/note-drawing';
import { drawingWords } from '@/components/notes/drawing-frame';
import { answerInNote } from '@/lib/checks/domain/note-answer';
import { findQuestion } from '@/lib/checks/domain/steps';
import { readFrontMatter } from '@/lib/notes/domain/front-matter';
import { checksIn, citedIn, drawingsIn, headingsIn, linkedNotes, NOTE_TOPICS, termsIn } from '@/lib/notes/domain/note';
import { figuresWithoutSource, hasFigure, plainText, sentencesOf, wordCount } from '@/lib/notes/domain/note-text';
import { noteOf } from '@/lib/notes/list-notes';
import { listWords } from '@/lib/notes/list-words';
import { readNote } from '@/lib/notes/read-note';
import { readWord } from '@/lib/notes/read-word';
import science from '../../fixtures/facts/ceramics-science.json';
import { seedSheets } from '../../builders/seed-sheets';
import { SHIPPED } from './shipped-notes';

const rules = new Set([...seedSheets.values()].flatMap((sheet) => sheet.rules.map(({ id }) => id)));
const pack = new Map(science.facts.map((fact) => [fact.id, fact]));

test('NOTE-1 the notes that people come for are there, each topic has some, and each is under review', () => {
  expect(SHIPPED.length).toBeGreaterThanOrEqual(24);
  expect(new Set(SHIPPED.flatMap(({ topics }) => topics))).toEqual(new Set(NOTE_TOPICS));
  expect(new Set(SHIPPED.map(({ title }) => title)).size).toBe(SHIPPED.length);
  expect(SHIPPED.filter(({ lookAgainBy }) => lookAgainBy > '2028-06-01').map(({ slug }) => slug)).toEqual([]);
  expect(SHIPPED.flatMap(({ slug, places }) => places.filter((code) => !seedSheets.has(code)).map((code) => `${slug}: ${code}`))).toEqual(
    [],
  );
});

test.each([
  ['no front matter', 'Text alone', /a-note\.mdx: the file does not begin/],
  ['a field twice', '---\ntitle: A\ntitle: B\n---\nText', /the field "title" stands twice/],
  ['a topic there is none of', file({ topics: 'weather' }), /a-note\.mdx: topics/],
  ['no day to look again', file({ lookAgainBy: 'soon' }), /lookAgainBy/],
  ['another slug', file({ slug: 'other-note' }), /its slug is "other-note"/],
  ['a field nobody knows', file({ colour: 'blue' }), /colour|Unrecognized/],
])('NOTE-1 a note with %s is refused with file and field', (_, text, said) => {
  expect(() => noteOf('a-note', text)).toThrow(said);
});

function file(changed: Readonly<Record<string, string>>): string {
  const whole = {
    title: 'A note',
    slug: 'a-note',
    summary: 'Short.',
    topics: 'surface',
    places: '',
    lookAgainBy: '2028-01-01',
    synonyms: '',
    ...changed,
  };
  return `---\n${Object.entries(whole)
    .map(([name, value]) => `${name}: ${value}`)
    .join('\n')}\n---\nText.`;
}

test('NOTE-1 front matter is read line by line, and the body keeps its own lines of hyphens', () => {
  expect(readFrontMatter('---\ntitle: A: b\n---\nOne\n\n---\n\nTwo')).toEqual({
    ok: true,
    value: { fields: { title: 'A: b' }, body: 'One\n\n---\n\nTwo' },
  });
});

test('NOTE-2 every figure in a note carries a source in its sentence or cell', () => {
  expect(SHIPPED.flatMap(({ slug, body }) => figuresWithoutSource(body).map((part) => `${slug}: ${part}`))).toEqual([]);
  expect(SHIPPED.filter(({ summary }) => hasFigure(summary)).map(({ slug }) => slug)).toEqual([]);
});

test.each([
  ['a sentence', 'It is fired at 1000 °C. Then it cools <Fact id="fi-01" />.', 1],
  ['a list item', '- Fill to 1 mm.\n- Wait <Fact id="lt-04" />.', 1],
  ['a table cell beside a cited one', '| a | b |\n|---|---|\n| x | 4 mg/L <Fact id="lt-44" /> | 3 mg/L |', 1],
  ['money', 'It costs DKK 2,500 a test.', 1],
  ['a cited sentence', 'It is fired at 1000 °C <Fact id="fi-01" />. Then it cools.', 0],
  ['a citation of a rule', 'At most 4 mg/L <Rule id="eu-pb-cat2" short />.', 0],
  ['numbers without a unit', 'There are 3 kinds, and cone 6 is one.', 0],
])('NOTE-2 the search for figures without a source knows %s', (_, body, found) => {
  expect(figuresWithoutSource(body)).toHaveLength(found);
});

test('NOTE-2 a drawing that shows figures is cited where it stands', () => {
  const withFigures = DRAWINGS.filter((name) => hasFigure(`${drawingWords(name, 'title')} ${drawingWords(name, 'about')}`));
  const bare = SHIPPED.flatMap(({ slug, body }) =>
    [...body.matchAll(/<Drawing of="([^"]+)"( \/>|>([\s\S]*?)<\/Drawing>)/g)].flatMap(([, name = '', , inside = '']) =>
      withFigures.includes(name) && !/<(Fact|Rule)\b/.test(inside) ? [`${slug}: ${name}`] : [],
    ),
  );
  expect(withFigures).toContain('fill-level');
  expect(bare).toEqual([]);
});

test('NOTE-3 a cited fact is told with the source and the evidence that the pack has', () => {
  const told = Object.entries(sources).map(([id, { source, evidence, weak }]) => {
    const fact = pack.get(id);
    return fact?.evidence === evidence &&
      weak === (fact.never_must as readonly string[]).includes('low-confidence') &&
      (evidence === 'common-practice' || (source.title === fact.source.title && source.publisher === fact.source.publisher))
      ? null
      : id;
  });
  expect(told.filter((id) => id !== null)).toEqual([]);
  const cited = new Set(SHIPPED.flatMap(({ body }) => citedIn(body).flatMap(({ kind, id }) => (kind === 'fact' ? [id] : []))));
  expect([...cited].filter((id) => !Object.hasOwn(sources, id))).toEqual([]);
  expect(Object.keys(sources).filter((id) => !cited.has(id))).toEqual([]);
});

test('NOTE-3 sources are numbered from one in the order of their first citation, without a gap', async () => {
  for (const { slug, body } of SHIPPED) {
    const read = await readNote(slug);
    if (!read.ok) throw new Error(slug);
    expect(read.value.sources.map(({ number }) => number)).toEqual(read.value.sources.map((_, place) => place + 1));
    expect(new Set(read.value.sources.flatMap(({ kind, ids }) => ids.map((id) => `${kind === 'rule' ? 'rule' : 'fact'} ${id}`)))).toEqual(
      new Set(citedIn(body).map(({ kind, id }) => `${kind} ${id}`)),
    );
  }
});

test('NOTE-5 every rule, note, word, drawing and answer a note names is there', () => {
  const words = new Set(listWords().map(({ slug }) => slug));
  const slugs = new Set(SHIPPED.map(({ slug }) => slug));
  const lost = SHIPPED.flatMap(({ slug, body }) => [
    ...citedIn(body).flatMap(({ kind, id }) => (kind === 'rule' && !rules.has(id) ? [`${slug}: rule ${id}`] : [])),
    ...linkedNotes(body).flatMap((id) => (slugs.has(id) ? [] : [`${slug}: note ${id}`])),
    ...termsIn(body).flatMap((id) => (words.has(id) ? [] : [`${slug}: word ${id}`])),
    ...drawingsIn(body).flatMap((id) => (DRAWINGS.includes(id) ? [] : [`${slug}: drawing ${id}`])),
    ...checksIn(body).flatMap(({ question, answer }) => {
      const found = findQuestion(question);
      return found !== null && answerInNote(found, answer) !== null ? [] : [`${slug}: ${question} = ${answer}`];
    }),
  ]);
  expect(lost).toEqual([]);
  expect(SHIPPED.filter(({ body }) => checksIn(body).length === 0).map(({ slug }) => slug)).toEqual([]);
  expect(DRAWINGS.filter((name) => !SHIPPED.some(({ body }) => drawingsIn(body).includes(name)))).toEqual([]);
});

test('NOTE-5 no note has two headings of one name, and every note is reached from another', () => {
  for (const { slug, body } of SHIPPED) {
    const ids = headingsIn(body).map(({ id }) => id);
    expect([slug, new Set(ids).size]).toEqual([slug, ids.length]);
  }
  const reached = new Set(SHIPPED.flatMap(({ slug, body }) => linkedNotes(body).filter((other) => other !== slug)));
  expect(SHIPPED.filter(({ slug }) => !reached.has(slug)).map(({ slug }) => slug)).toEqual([]);
});

test('NOTE-6 no note, no word and no drawing uses a word that we never use in our own voice', () => {
  const texts = [
    ...SHIPPED.map((note) => [note.slug, [note.title, note.summary, plainText(note.body)].join('\n')] as const),
    ...listWords().map((word) => [word.slug, `${word.name} ${word.definition} ${(word.also['en'] ?? []).join(' ')}`] as const),
    ...DRAWINGS.map((name) => [name, `${drawingWords(name, 'title')} ${drawingWords(name, 'about')}`] as const),
  ];
  const phrases = new RegExp(allowed.allowed.join('|'), 'gi');
  const banned = new RegExp(String.raw`(?<![\w-])(?:${allowed.banned.join('|')})(?![\w-])`, 'i');
  const found = texts.flatMap(([name, text]) => {
    const word = banned.exec(text.replace(phrases, ''))?.[0];
    return word === undefined ? [] : [`${name}: ${word}`];
  });
  expect(found).toEqual([]);
});

test('NOTE-7 sentences are short', () => {
  const measured = SHIPPED.map(({ slug, body }) => {
    const lengths = sentencesOf(body).map(wordCount);
    return { slug, words: wordCount(plainText(body)), average: lengths.reduce((sum, one) => sum + one, 0) / lengths.length };
  });
  const long = SHIPPED.flatMap(({ slug, summary, body }) =>
    [...sentencesOf(body), ...sentencesOf(summary)]
      .filter((sentence) => wordCount(sentence) > 25)
      .map((sentence) => `${slug}: ${sentence}`),
  );
  const total = measured.reduce((sum, { words }) => sum + words, 0);
  console.log(measured.map(({ slug, words, average }) => `${slug}: ${words} words, ${average.toFixed(1)} a sentence`).join('\n'));
  console.log(`${SHIPPED.length} notes, ${total} words`);
  expect(long).toEqual([]);
  expect(measured.filter(({ average }) => average > 17)).toEqual([]);
  expect(measured.filter(({ words }) => words < 330 || words > 950)).toEqual([]);
});

test('NOTE-7 sentences are told apart at their ends, not at figures or marks', () => {
  expect(sentencesOf('It is 3.5 mm <Fact id="lt-04" />. Then **bold** text. "Quoted." Next one?')).toEqual([
    'It is 3.5 mm.',
    'Then bold text.',
    '"Quoted."',
    'Next one?',
  ]);
});

test('NOTE-9 the word list has sixty words at least, each once, with its words in three other languages', () => {
  const words = listWords();
  expect(words.length).toBeGreaterThanOrEqual(60);
  expect(new Set(words.map(({ slug }) => slug)).size).toBe(words.length);
  expect(new Set(words.map(({ name }) => name)).size).toBe(words.length);
  expect(words.filter(({ also }) => ['de', 'da', 'fr'].some((language) => also[language] === undefined)).map(({ slug }) => slug)).toEqual(
    [],
  );
  const slugs = new Set(words.map(({ slug }) => slug));
  expect(
    words.flatMap(({ slug, see }) => see.filter((other) => other === slug || !slugs.has(other)).map((other) => `${slug}: ${other}`)),
  ).toEqual([]);
});

test('NOTE-5 a word names the notes that use it, and no others', async () => {
  const crazing = await readWord('crazing');
  expect(crazing.ok && crazing.value.notes.map(({ slug }) => slug)).toContain('crazing-and-crackle');
  const uranium = await readWord('uranium');
  expect(uranium.ok && uranium.value.notes.map(({ slug }) => slug)).toEqual(['microwave-oven-dishwasher']);
  expect(await readWord('no-such-word')).toEqual({ ok: false, error: { kind: 'not-found' } });
});
