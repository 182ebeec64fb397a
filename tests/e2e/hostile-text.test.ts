import { renderToStaticMarkup } from 'react-dom/server';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { insertRemark } from '@/db/amendment-remarks';
import { db } from '@/db/connection';
import { publishEdition } from '@/db/editions';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import type { AmendmentId } from '@/lib/regions/domain/amendment';
import type { Rule, Source } from '@/lib/regions/domain/rule';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sheetDocument } from '@/lib/regions/schema';
import { renderMarkdown } from '@/lib/server/markdown';
import { newId } from '@/lib/server/new-id';
import { HOSTILE } from '../builders/hostile-text';
import { foundPlaces, putSent } from '../builders/sent-amendments';
import { aRule, aSheet, aSource } from '../builders/small-world';
import { openBrowser, visit } from './browser';
import { aPerson, visitAs, type Person } from './signed-in';

const CODE = 'qh';
const TEXTS = HOSTILE.map(({ text }) => text.trim());
const IN_NAMES = '<img src=x onerror=__fired++>';
const at = (place: number): string => TEXTS[place % TEXTS.length] ?? '';

let browser: Browser;
let author: Person;
let moderator: Person;
let steward: Person;
let amendment: AmendmentId;
let doubt: string;

/** Four texts a rule, so that together the rules hold every text there is. */
function hostileRule(place: number): Rule {
  const [title, says, note, passage] = [0, 1, 2, 3].map((step) => at(place * 4 + step));
  return aRule(`${CODE}-r${String(place)}`, {
    region: CODE,
    title: (title ?? '').slice(0, 120),
    says: says ?? '',
    note: note ?? '',
    payload: { topic: 'label', words: { en: at(place + 7) }, placement: at(place + 11), details: at(place + 13) },
    sources: [
      { source: `${CODE}-s`, locator: at(place), passage: passage ?? '', passageLang: 'en', standing: 'guidance', evidence: 'read' },
    ],
    order: place + 10,
  });
}

function hostileSheet(): Sheet {
  const source: Source = { ...aSource, id: `${CODE}-s`, title: at(0), publisher: at(21), identifier: at(64), seenVia: at(99) };
  const contacts = [0, 1, 2].map((place) => ({ name: at(place * 9), url: null, role: at(place * 9 + 1), evidence: 'read' as const }));
  return sheetDocument.parse({
    ...aSheet(CODE),
    name: IN_NAMES,
    text: TEXTS.slice(0, 60).join('\n\n'),
    gaps: TEXTS,
    sources: [source],
    authorities: contacts,
    accreditation: contacts,
    terms: [0, 1, 2].map((place) => ({
      id: `${CODE}-t${String(place)}`,
      region: CODE,
      name: at(place * 31),
      says: at(place * 31 + 1),
      when: true,
      from: null,
      to: null,
      sources: [{ source: `${CODE}-s`, locator: at(5), standing: 'guidance', evidence: 'read' }],
    })),
    rules: Array.from({ length: Math.ceil(TEXTS.length / 4) }, (_, place) => hostileRule(place)),
  });
}

beforeAll(async () => {
  browser = await openBrowser();
  author = await aPerson('editor', IN_NAMES);
  moderator = await aPerson('moderator', '"><svg onload=__fired++>');
  steward = await aPerson('steward');
  await foundPlaces([aSheet(CODE)]);
  amendment = await putSent(author.id, { region: CODE, baseNumber: 1, document: hostileSheet(), summary: TEXTS.join(' ').slice(0, 500) });
  doubt = newId(new Date());
  await inTransaction(db, async (trx) => {
    const said = { answerTo: null, line: `rules/${CODE}-r0`, authorId: moderator.id, at: new Date() };
    for (const words of TEXTS.slice(0, 40)) await insertRemark(trx, amendment, { ...said, id: newId(new Date()), words });
    await trx('doubts').insert({
      id: doubt,
      region: CODE,
      rule_id: `${CODE}-name`,
      words: TEXTS.join('\n').slice(0, 2000),
      elsewhere: TEXTS.slice(60).join('\n').slice(0, 1000),
      link: 'javascript:__fired++',
      state: 'waiting',
      made_at: new Date(),
    });
    return ok(null);
  });
});
afterAll(async () => {
  await db('doubts').where({ region: CODE }).del();
  await db('accounts').whereIn('id', [author.id, moderator.id]).update({ name: 'Nobody' });
  await browser.close();
  await db.destroy();
});

type Seen = { readonly fired: number; readonly inline: readonly string[]; readonly odd: readonly string[] };
declare global {
  var __fired: number;
  var brokenPolicies: string[];
}

/** A page on which anything that runs is counted, be it a handler, a script, a dialog, or one that the policy stopped. */
async function watched(page: Page): Promise<Page> {
  await page.addInitScript(() => {
    globalThis.__fired = 0;
    globalThis.brokenPolicies = [];
    document.addEventListener('securitypolicyviolation', ({ violatedDirective, blockedURI, sample }) => {
      globalThis.brokenPolicies.push(`${violatedDirective} ${blockedURI} ${sample}`);
    });
  });
  page.on('dialog', (dialog) => {
    void dialog.dismiss();
    throw new Error(`A dialog opened on ${page.url()}`);
  });
  return page;
}

/** Unfolds all there is, goes over it, and tells what ran and what stands there that may not. */
const look = (page: Page): Promise<Seen> =>
  page.evaluate(() => {
    for (const folded of document.querySelectorAll('details')) folded.open = true;
    for (const each of document.querySelectorAll('main *')) {
      each.dispatchEvent(new MouseEvent('mouseover', { bubbles: true }));
      each.dispatchEvent(new FocusEvent('focus'));
    }
    const odd = [...document.querySelectorAll('*')].flatMap((each) => {
      const handlers = each.getAttributeNames().filter((name) => name.startsWith('on'));
      const href = each instanceof HTMLAnchorElement && each.hasAttribute('href') ? each.protocol : 'https:';
      // The foot of a printed page is a style of ours that says the page's name: escaped, it holds no mark that could end it.
      const isFoot = each.matches('main style') && /^@page\{[^<]*$/.test(each.textContent);
      const isBad = each.matches('iframe, object, embed, base, main script, main style, main img, main math, main video, main audio');
      return [
        ...handlers.map((name) => `${each.tagName} ${name}`),
        ...(['http:', 'https:', 'mailto:'].includes(href) ? [] : [`${each.tagName} ${href}`]),
        ...(isBad && !isFoot ? [each.outerHTML.slice(0, 80)] : []),
      ];
    });
    return { fired: globalThis.__fired, inline: globalThis.brokenPolicies, odd };
  });

const NOTHING: Seen = { fired: 0, inline: [], odd: [] };

async function tryPages(page: Page, paths: readonly string[]): Promise<void> {
  for (const path of paths) {
    const answer = await page.goto(path);
    expect([path, answer?.status()]).toEqual([path, 200]);
    await page.waitForLoadState('load');
    expect([path, await look(page)]).toEqual([path, NOTHING]);
  }
}

test('REG-93 S33 the watch sees a handler that runs', async () => {
  const page = await watched(await (await visit(browser)).newPage());
  await page.goto('/privacy');
  await page.evaluate(() => {
    const link = document.createElement('a');
    link.setAttribute('onmouseover', 'x');
    document.querySelector('main')?.append(link);
    globalThis.__fired += 1;
  });
  const { fired, inline, odd } = await look(page);
  expect([fired, inline.length > 0, odd]).toEqual([1, true, ['A onmouseover']]);
});

test('REG-93 S33 an amendment full of hostile texts runs nowhere: not for its author, not for the moderator who looks at it', async () => {
  const own = `/bench/amendments/${amendment}`;
  await tryPages(await watched(await (await visitAs(browser, author)).newPage()), ['/bench', '/bench/amendments', own]);
  const review = `/sorting-table/${amendment}`;
  const pages = ['/sorting-table', review, `${review}/approve`, `${review}/send-back`, `${review}/hold`, '/doubts', `/doubts/${doubt}`];
  await tryPages(await watched(await (await visitAs(browser, moderator)).newPage()), pages);
  await db('amendments').where({ id: amendment }).update({ state: 'sent-back' });
  const draft = [own, `${own}/check`, `${own}/rules/${CODE}-r0`, `${own}/terms/${CODE}-t0`, `${own}/sources/${CODE}-s`, `${own}/text`];
  await tryPages(await watched(await (await visitAs(browser, author)).newPage()), draft);
});

test('REG-93 S33 S35 in use they run nowhere either, for anybody', async () => {
  await inTransaction(db, async (trx) => {
    const summary = TEXTS.join(' ').slice(0, 500);
    await publishEdition(trx, 2, { sheet: hostileSheet(), origin: 'amendment', summary, at: new Date() });
    await trx('regions').where({ code: CODE }).update({ name: IN_NAMES });
    await trx('doubts')
      .where({ id: doubt })
      .update({
        rule_id: `${CODE}-r0`,
        state: 'answered',
        answer: TEXTS.slice(100).join('\n').slice(0, 2000),
        answered_by: moderator.id,
        answered_at: new Date(),
      });
    return ok(null);
  });
  const sheet = `/regions/${CODE}`;
  const rules = [0, 28, 56].flatMap((place) => [`/rules/${CODE}-r${String(place)}`, `/rules/${CODE}-r${String(place)}/doubt`]);
  const pages = [sheet, `${sheet}/editions`, `${sheet}/editions/2`, `${sheet}/editions/compare?from=1&to=2`, ...rules];
  const over = [`/terms/${CODE}-t0`, '/regions', '/coverage', '/changes', `/sources?region=${CODE}`, '/day-book', `/check?region=${CODE}`];
  const asked = TEXTS.slice(0, 3).map((text) => `/search?q=${encodeURIComponent(text)}`);
  await tryPages(await watched(await (await visit(browser)).newPage()), [...pages, ...over, ...asked]);
  await tryPages(await watched(await (await visitAs(browser, moderator)).newPage()), [`/look-again?region=${CODE}&days=3660`, '/bench']);
  await tryPages(await watched(await (await visitAs(browser, steward)).newPage()), ['/stewards', `/stewards/accounts/${author.id}`]);
});

test('REG-93 S33 drawn Markdown, read by a browser without any policy, read again and once more, runs nothing', async () => {
  const drawn = HOSTILE.flatMap(({ text }) =>
    [text, `- ${text}`, `> ${text}`, `[x](${text})`, `[${text}](/a)`, `| a |\n|---|\n| ${text} |`].flatMap((source) => {
      const made = renderMarkdown(source);
      return made.ok ? [renderToStaticMarkup(made.value)] : [];
    }),
  );
  const page = await browser.newPage();
  await page.setContent(
    '<!doctype html><title>x</title><base href="https://site.example.test/"><main></main><script>globalThis.__fired = 0</script>',
  );
  const odd = await page.evaluate(async (all) => {
    const main = document.querySelector('main') ?? document.body;
    const found: string[] = [];
    for (const html of all) {
      main.innerHTML = html;
      for (let again = 0; again < 3; again += 1) main.setHTMLUnsafe(main.innerHTML);
      for (const each of main.querySelectorAll('*')) {
        const bad = each.getAttributeNames().some((name) => name.startsWith('on') || name === 'style' || name === 'srcdoc');
        const isAway = each instanceof HTMLAnchorElement && each.hasAttribute('href') && !/^(?:https?:|mailto:|about:)/.test(each.protocol);
        if (bad || isAway || each.matches('script, img, svg, math, iframe, object, embed, form, input, style, template')) found.push(html);
      }
    }
    await new Promise((resolve) => requestAnimationFrame(resolve));
    return { found, fired: globalThis.__fired };
  }, drawn);
  expect(drawn.length).toBeGreaterThan(1000);
  expect(odd).toEqual({ found: [], fired: 0 });
  await page.close();
});
