import { spawn, type ChildProcess } from 'node:child_process';
import { createInterface } from 'node:readline';
import { gzipSync } from 'node:zlib';
import knex, { type Knex } from 'knex';
import { z } from 'zod';
import { connectionTo, knexSettings } from '../../db/knex-settings';
import { migrate } from '../../db/migrator';
import { listTitles } from '../../db/search';
import type { SearchEntry } from '../../lib/search/domain/entry';
import { storedEntry } from '../../lib/search/domain/stored-entry';
import { searchPages } from '../../lib/search/search-pages';
import { figure, msOf, quantile } from './measure';
import { Random } from './random';

/* What search costs with far more in it than there is: invented notes and rules, on a database of its own. */

const NOTES = Number(process.env['FOOTRING_BENCH_NOTES'] ?? 10_000);
const RULES = Number(process.env['FOOTRING_BENCH_RULES'] ?? 250_000);
const PLACES = 200;
const VOCABULARY = 20_000;
const ROUNDS = 3;

const TERMS = 'lead cadmium glaze crazing rim label declaration register packaging limit kiln earthenware sealer cobalt lustre test'.split(
  ' ',
);
const QUESTIONS = [
  'crazing',
  'lead',
  'raw inside',
  'lead limit',
  'declaration of compliance',
  'cadnium',
  'glaze label rim',
  'Bleiglasur',
  'is this glaze all right',
  'unknownword',
  'packaging register',
  'krakelering',
  'w120 w340',
  'w7',
  'w15000',
];

/** Words as they are in texts: few very often, most seldom. */
function aWord(random: Random): string {
  if (random.chance(0.08)) return random.from(TERMS, 'lead');
  return `w${Math.floor(VOCABULARY ** random.next())}`;
}

const someWords = (random: Random, count: number): string => Array.from({ length: count }, () => aWord(random)).join(' ');

function invented(random: Random, kind: 'note' | 'rule', number: number): SearchEntry {
  const dates = { from: null, to: null, lookAgainBy: null };
  const region = kind === 'note' ? '' : `p${random.below(PLACES)}`;
  const text = Array.from({ length: kind === 'note' ? 30 : 4 }, () => `${someWords(random, 14)}.`).join(' ');
  const also = kind === 'note' ? [someWords(random, 2), someWords(random, 1)] : [];
  return {
    kind,
    region,
    slug: `${kind}-${number}`,
    edition: 1,
    title: someWords(random, 6),
    also,
    text,
    strength: null,
    places: [],
    ...dates,
  };
}

async function fill(db: Knex): Promise<void> {
  const random = new Random(7);
  const words = new Map<string, number>();
  for (let done = 0; done < NOTES + RULES; done += 500) {
    const entries = Array.from({ length: Math.min(500, NOTES + RULES - done) }, (_, place) => {
      const number = done + place;
      return storedEntry(invented(random, number < NOTES ? 'note' : 'rule', number));
    });
    for (const word of entries.flatMap((entry) => entry.vocabulary)) words.set(word, (words.get(word) ?? 0) + 1);
    await db('search_entries').insert(entries.map(columnsOf));
  }
  const rows = [...words].map(([word, uses]) => ({ word, uses }));
  for (let start = 0; start < rows.length; start += 1000) await db('search_words').insert(rows.slice(start, start + 1000));
  await db('search_state').insert({ id: 1, revision: 1 });
}

const columnsOf = (entry: ReturnType<typeof storedEntry>): object => ({
  kind: entry.kind,
  region: entry.region,
  slug: entry.slug,
  edition_number: entry.edition,
  title: entry.title,
  also: entry.also.join('\n'),
  text: entry.text,
  places: '',
  heading_words: entry.headingWords,
  all_words: entry.allWords,
});

async function startServer(): Promise<{ readonly child: ChildProcess; readonly ownerUrl: string }> {
  const child = spawn(process.execPath, ['scripts/test-database.mjs'], { stdio: ['pipe', 'pipe', 'inherit'] });
  for await (const line of createInterface(child.stdout)) {
    if (line.startsWith('{')) return { child, ...z.object({ ownerUrl: z.string() }).parse(JSON.parse(line)) };
  }
  throw new Error('The database server did not start.');
}

/** Notes and rules by the ten thousand: time of a search, memory, time and size of the index. */
export async function benchSearch(): Promise<string> {
  const { child, ownerUrl } = await startServer();
  const db = knex({ ...knexSettings({ most: 4 }), connection: connectionTo(ownerUrl) });
  try {
    await migrate(db);
    const buildMs = await msOf(() => fill(db));
    return await measured(db, buildMs);
  } finally {
    await db.destroy();
    child.stdin?.end();
  }
}

async function measured(db: Knex, buildMs: number): Promise<string> {
  const ctx = { db, now: new Date() };
  const ask = (q: string): Promise<unknown> => searchPages(ctx, { q, kind: null, region: null, offset: 0, limit: 20 });
  const firstMs = await msOf(() => ask('glaze'));
  for (const q of QUESTIONS) await ask(q);
  const times: { readonly q: string; readonly ms: number }[] = [];
  for (let round = 0; round < ROUNDS; round += 1) for (const q of QUESTIONS) times.push({ q, ms: await msOf(() => ask(q)) });
  const all = times.map(({ ms }) => ms);
  const titles = JSON.stringify(await listTitles(db, 'note', NOTES));
  const slowest = QUESTIONS.map((q) => ({
    q,
    ms: quantile(
      times.filter((one) => one.q === q).map(({ ms }) => ms),
      0.5,
    ),
  }))
    .toSorted((a, b) => b.ms - a.ms)
    .slice(0, 4);
  return [
    `| ${NOTES} notes, ${RULES} rules | | aim |`,
    '| --- | --- | --- |',
    `| search, p50 / p95 | ${figure(quantile(all, 0.5))} / ${figure(quantile(all, 0.95))} ms | p95 at most 30 ms |`,
    `| slowest questions | ${slowest.map(({ q, ms }) => `${q} ${figure(ms)} ms`).join(', ')} | |`,
    `| first search, with the words read in | ${figure(firstMs)} ms | |`,
    `| index built in | ${figure(buildMs / 1000)} s | |`,
    `| tables, without the lists of full text | ${await sizeOf(db)} MB | |`,
    `| memory of the process | ${figure(process.memoryUsage().rss / 1e6)} MB | |`,
    `| titles of all notes, gzip | ${figure(gzipSync(titles).length / 1000)} kB | the suggestion index holds 500 of them |`,
  ].join('\n');
}

async function sizeOf(db: Knex): Promise<string> {
  const rows: unknown = await db('information_schema.tables')
    .where({ table_schema: db.raw('database()') })
    .where('table_name', 'like', 'search%')
    .sum({ bytes: db.raw('data_length + index_length') });
  return figure((z.array(z.object({ bytes: z.coerce.number() })).parse(rows)[0]?.bytes ?? 0) / 1e6);
}
