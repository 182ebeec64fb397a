import { randomUUID } from 'node:crypto';
import { afterAll, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { findEdition } from '@/db/editions';
import type { AmendmentId, AmendmentState } from '@/lib/regions/domain/amendment';
import { putSent } from '../builders/sent-amendments';
import { aRule } from '../builders/small-world';
import { SITE } from './browser';
import { aPerson, cookieOf } from './signed-in';

afterAll(async () => {
  await db.destroy();
});

const REGION = 'lu';
const NOT_IN_USE: readonly AmendmentState[] = ['draft', 'sent', 'held', 'sent-back', 'once-approved', 'withdrawn', 'refused-stale'];

const canary = `canary${randomUUID().slice(0, 8)}`;
const rule = `${REGION}-${canary}`;
/** Not of the canary: the page that finds nothing says back what was asked for. */
const text = `text-${randomUUID().slice(0, 8)}`;

/** One amendment in each state that is not in use, with the canary in every text of it. */
async function amendments(): Promise<readonly AmendmentId[]> {
  const { id: author } = await aPerson('editor');
  const base = await findEdition(db, REGION, 1);
  if (base === null) throw new Error(`There is no sheet of ${REGION}`);
  const { sheet } = base;
  const told = { region: REGION, title: canary, says: `Ask about ${canary}.`, note: canary };
  const source = { id: text, title: canary, publisher: canary };
  const cited = [{ source: text, locator: canary, passage: canary, passageLang: 'fr', standing: 'guidance', evidence: 'read' }] as const;
  const document = {
    ...sheet,
    text: `${sheet.text}\n\n${canary}`,
    gaps: [canary],
    sources: [...sheet.sources, source],
    rules: [...sheet.rules, aRule(rule, { ...told, sources: cited })],
  };
  return Promise.all(NOT_IN_USE.map((state) => putSent(author, { region: REGION, baseNumber: 1, document, summary: canary, state })));
}

const PUBLIC = [
  '/',
  '/regions',
  `/regions/${REGION}`,
  `/regions/${REGION}/editions`,
  `/regions/${REGION}/editions/compare`,
  `/rules/${rule}`,
  `/sources/${text}`,
  `/sources?region=${REGION}`,
  '/changes',
  '/coverage',
  '/limits',
  '/day-book',
  '/notes',
  '/words',
  '/sitemap.xml',
  '/api/v1/regions',
  `/api/v1/regions/${REGION}`,
  `/api/v1/regions/${REGION}/editions`,
  `/api/v1/rules/${rule}`,
  '/api/v1/search-index',
  '/look-again',
  '/doubts',
  '/bench',
  '/bench/amendments',
  '/sorting-table',
];
/** Where what was asked for is said back: the answer must be that of a word nobody ever wrote. */
const ECHOING = ['/search?q=', '/api/v1/search?q='];

/** What a reader can get from an address, as a page and as what a script asks for. */
async function answersAt(path: string, cookie: string): Promise<readonly string[]> {
  const asked = [{ cookie }, { cookie, rsc: '1' }, { cookie, rsc: '1', 'next-router-prefetch': '1' }];
  return Promise.all(asked.map(async (headers) => (await fetch(SITE + path, { headers })).text()));
}

test('S28 what is not in use is on no page, in no answer and in no search, for readers, makers and other editors', async () => {
  const ids = await amendments();
  const own = ids.flatMap((id) => ['', '/check', `/rules/${rule}`, '/text'].map((part) => `/bench/amendments/${id}${part}`));
  const people = [await aPerson('maker'), await aPerson('editor')];
  const cookies = ['', ...(await Promise.all(people.map(cookieOf)))];
  const found: string[] = [];
  for (const cookie of cookies) {
    for (const path of [...PUBLIC, ...own, ...ids.map((id) => `/sorting-table/${id}`)]) {
      // An address that does not exist may be said back; what it would hold may not.
      const answers = (await answersAt(path, cookie)).map((answer) => answer.replaceAll(path, '').replaceAll(encodeURIComponent(path), ''));
      if (answers.some((answer) => answer.replaceAll(rule, '').includes(canary))) found.push(path);
    }
    for (const path of ECHOING) {
      const nothing = canary.replace('canary', 'nobody');
      const [asked, unknown] = [await answersAt(path + canary, cookie), await answersAt(path + nothing, cookie)];
      const links = (answer: string): number => answer.split(rule).length + answer.split(`Ask about ${canary}`).length;
      if (asked.some((answer, at) => links(answer) !== links(unknown[at] ?? ''))) found.push(path);
    }
  }
  expect(found).toEqual([]);
});

test('S28 drafts and what was taken back are there for no moderator either', async () => {
  const ids = await amendments();
  const cookie = await cookieOf(await aPerson('moderator'));
  for (const [at, state] of NOT_IN_USE.entries()) {
    const { status } = await fetch(`${SITE}/sorting-table/${ids[at] ?? ''}`, { headers: { cookie }, redirect: 'manual' });
    expect([state, status]).toEqual([state, ['draft', 'withdrawn'].includes(state) ? 404 : 200]);
  }
});
