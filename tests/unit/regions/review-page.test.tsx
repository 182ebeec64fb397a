import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { claimAnchor, linesOf, namesOfLines, remarksAnchor } from '@/components/review/anchors';
import { BecomesTrue, Effects } from '@/components/review/becomes-true';
import { liveTable, nextTable } from '@/components/review/live-rows';
import type { RemarkActs } from '@/components/review/line-remarks';
import { ReadSources } from '@/components/review/read-sources';
import { ReviewBody } from '@/components/review/review-body';
import { ReviewHead } from '@/components/review/review-head';
import { ReviewNotes } from '@/components/review/review-notes';
import { Tick } from '@/components/review/tick';
import { shownRow, type ShownRow, type ShownTable } from '@/components/review/waiting-words';
import type { RuleMeaning } from '@/lib/checks/domain/meaning';
import { ok } from '@/lib/kernel/result';
import { amendmentId } from '@/lib/regions/amendment-schema';
import { accountId } from '@/lib/accounts/schema';
import type { Remark, Review, WaitingRow } from '@/lib/regions/domain/amendment-view';
import { claimsToRead } from '@/lib/regions/domain/claims-to-read';
import type { ComparedEditions } from '@/lib/regions/domain/compared-editions';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { sheetDifference } from '@/lib/regions/domain/sheet-difference';
import { aDate } from '../../builders/seed-sheets';
import { aLimit, aRule, aSheet } from '../../builders/small-world';

const NOW = new Date('2026-12-01T10:00:00Z');
const ID = amendmentId.parse('0190a000-0000-7000-8000-000000000001');
const AUTHOR = accountId.parse('0190a000-0000-7000-8000-000000000002');
const HOSTILE = '<img src=x onerror=alert(1)> [here](javascript:alert(1))';

const base: Sheet = aSheet('xa', { rules: [aRule('xa-name'), aRule('xa-gone'), aLimit('xa-lead', 4)] });
const proposed: Sheet = {
  ...base,
  text: 'An invented place, told anew.',
  rules: [
    { ...aRule('xa-name'), says: 'Sellers give their name and address on request.' },
    aLimit('xa-lead', 2),
    aRule('xa-mark', { title: 'A mark', says: `Mark each pot. ${HOSTILE}`, from: aDate('2027-03-01') }),
  ],
};

const meaning: RuleMeaning = {
  rule: 'xa-mark',
  kind: 'added',
  example: { answers: { form: 'bowl' }, before: null, after: 'applies' },
  share: { cases: '1', of: '4', percent: '25' },
};

const comparison: ComparedEditions = {
  code: 'xa',
  name: 'Land of xa',
  from: { number: 3, summary: 'Before', inUseFrom: NOW },
  to: { number: 4, summary: 'After', inUseFrom: NOW },
  on: aDate('2026-12-01'),
  items: sheetDifference(base, proposed),
  meanings: ok([meaning]),
  below: [
    { code: 'xb', name: 'Lower land', meanings: ok([meaning]) },
    { code: 'xc', name: 'Still land', meanings: ok([]) },
  ],
  trials: { total: 2, unchanged: 1, unread: 0, changed: [{ id: 't1', title: 'A blue bowl', on: aDate('2026-12-01'), lines: [] }] },
  names: { terms: new Map(), regions: new Map(), rules: new Map([['xa-mark', 'A mark']]) },
};

const remark = (line: string, over: Partial<Remark> = {}): Remark => ({
  id: `0190a000-0000-7000-8000-0000000001${line.length.toString().padStart(2, '0')}`,
  line,
  by: 'Mo',
  isOwn: false,
  words: HOSTILE,
  at: NOW,
  answers: [],
  isAnswered: false,
  ...over,
});

const aReview = (over: Partial<Review> = {}): Review => ({
  amendment: {
    id: ID,
    region: 'xa',
    authorId: AUTHOR,
    state: 'sent',
    version: 2,
    baseNumber: 3,
    summary: `Sellers give an address. ${HOSTILE}`,
    intended: { t1: 'Blue was never meant.' },
    madeAt: NOW,
    changedAt: NOW,
    sentAt: new Date('2026-11-28T23:00:00Z'),
    openedBy: null,
    openedAt: null,
    editionNumber: null,
  },
  name: 'Land of xa',
  author: 'Ida',
  isOwn: false,
  comparison,
  findings: [
    {
      check: 'C4',
      level: 'note',
      at: { list: 'rules', id: 'xa-mark', field: 'sources/0/passage' },
      kind: 'no-passage',
      values: { target: 'xa-mark' },
    },
  ],
  claims: claimsToRead(base, proposed).map((claim, at) => ({ ...claim, fileId: null, isRead: at === 0 })),
  remarks: [remark('rules/xa-mark'), remark('rules/xa-mark#0'), remark('rules/xa-was-there')],
  decisions: [],
  needed: 2,
  given: 0,
  gaveIt: false,
  othersLeft: 1,
  openElsewhere: { by: 'Ada', at: NOW },
  alsoOpen: [],
  stale: null,
  ...over,
});

const acts: RemarkActs = {
  amendment: ID,
  busy: 'At work',
  add: (prev) => Promise.resolve(prev),
  answer: (prev) => Promise.resolve(prev),
  mark: () => Promise.resolve(),
  first: () => ({ key: crypto.randomUUID(), values: {}, errors: {}, tries: 0 }),
  atLine: null,
  isKept: false,
};

function drawn(review: Review, mayDecide = true): string {
  const names = namesOfLines(review.comparison.items, review.claims);
  return renderToStaticMarkup(
    <main>
      <ReviewHead review={review} line={[]} now={NOW} />
      <ReviewNotes review={review} names={names} />
      <ReviewBody
        review={review}
        names={names}
        acts={mayDecide ? acts : null}
        tick={
          mayDecide
            ? ({ key, isRead }) => (
                <Tick
                  action={(prev) => Promise.resolve(prev)}
                  first={{ key, isRead, fault: null }}
                  hidden={{ id: ID, version: '2', claim: key }}
                  label="I have read this source"
                  about={key}
                />
              )
            : null
        }
        giveBack={mayDecide ? <button type="submit">Give it back</button> : null}
        release={<button type="submit">Release it</button>}
      />
    </main>,
  );
}

const textOf = (html: string): string => html.replace(/<[^>]+>/g, ' ').replace(/\s+/g, ' ');
const said = (node: React.ReactElement): string => textOf(renderToStaticMarkup(node));

describe('D6 what becomes true is said in words', () => {
  const sentences = said(<BecomesTrue compared={comparison} />);

  test('of a rule that is added, changed, withdrawn, and of the text', () => {
    expect(sentences).toContain('New rule: “A mark”.');
    expect(sentences).toMatch(/The rule “About xa-name” is changed: What to do: Sellers give their name and address on request\./);
    expect(sentences).toMatch(/The rule “About xa-lead” is changed: .*2 mg\/L/);
    expect(sentences).toContain('The rule “About xa-gone” no longer stands.');
    expect(sentences).toContain('In force from 1 March 2027');
    expect(sentences).toMatch(/The sheet itself is changed: Text: the text is changed/);
  });

  test('and not what stood before', () => {
    expect(sentences).not.toMatch(/4 mg\/L|give their name on request/);
  });

  test('where, for which pieces and from when', () => {
    const effects = said(<Effects compared={comparison} needsSecond />);
    expect(effects).toContain('It also changes the list of one place below: Lower land.');
    expect(effects).toContain('One place reads it as a layer above its own, and its list stays as it is.');
    expect(effects).toContain('One rule applies to other pieces than now:');
    expect(effects).toContain('From the moment a second moderator approves, as edition 4');
    expect(said(<Effects compared={comparison} needsSecond={false} />)).toContain('From the moment you approve, as edition 4');
  });
});

describe('D1 D5 the page of an amendment', () => {
  const html = drawn(aReview());
  const ids = [...html.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);

  test('has each id once, and every link within it leads somewhere', () => {
    expect(ids.filter((id, at) => ids.indexOf(id) !== at)).toEqual([]);
    const asked = [...html.matchAll(/href="#([^"]+)"/g)].map(([, id]) => id);
    expect(asked.length).toBeGreaterThan(7);
    expect(asked.filter((id) => !ids.includes(id))).toEqual([]);
  });

  test('skips no level of headings', () => {
    const levels = [1, ...[...html.matchAll(/<h(\d)/g)].map(([, level]) => Number(level))];
    expect(levels.every((level, at) => at === 0 || level - (levels[at - 1] ?? 0) <= 1)).toBe(true);
  });

  test('shows each claim with its passage in its language, and a tick of its own', () => {
    const claims = claimsToRead(base, proposed);
    expect(claims.map(({ key }) => key)).toEqual(['rules/xa-name#0', 'rules/xa-lead#0', 'rules/xa-mark#0']);
    for (const { key } of claims) expect(ids).toContain(claimAnchor(key));
    expect(html.match(/<blockquote lang="en" class="claim-passage">/g)).toHaveLength(3);
    expect([...html.matchAll(/aria-pressed="(true|false)"/g)].map(([, pressed]) => pressed)).toEqual(['true', 'false', 'false']);
    expect(textOf(html)).toContain('1 of 3 sources read by you');
  });

  test('ties each remark to its line, and keeps one whose line is gone', () => {
    expect(ids).toEqual(expect.arrayContaining([remarksAnchor('rules/xa-mark'), remarksAnchor('rules/xa-mark#0')]));
    expect(textOf(html)).toContain('3 remarks, in the order they were made.');
    expect(textOf(html)).toContain('a line that is no longer changed');
  });

  test('a proposed rule has no page yet, so nothing leads to one', () => {
    expect(html).toContain('href="/rules/xa-name"');
    expect(html).not.toContain('<a href="/rules/xa-mark">A mark</a> <span class="badge');
  });

  test('tells why the author means a trial piece to come out otherwise', () => {
    expect(textOf(html)).toMatch(/A blue bowl Blue was never meant\./);
  });

  test('S33 shows what people wrote as the letters it is', () => {
    expect(html).not.toMatch(/<img|href="javascript:/i);
    expect(html.match(/&lt;img src=x onerror=alert\(1\)&gt;/g)?.length).toBeGreaterThan(5);
  });

  test('names what the checks found by titles and fields, not by ids', () => {
    expect(textOf(html)).toContain('1 thing to know');
    expect(textOf(html)).toContain('Rule “A mark”, Source.');
  });

  test('says how long it waits and who else looks at it', () => {
    expect(textOf(html)).toMatch(/28 November 2026 \(3 days ago\)/);
    expect(textOf(html)).toContain('Ada, since 1 December 2026');
  });
});

describe('what can be decided', () => {
  test('nothing by the author, who is told why', () => {
    const html = drawn(aReview({ isOwn: true }), false);
    expect(html).not.toMatch(/<form|<button|\/approve"/);
    expect(textOf(html)).toContain('This is your own amendment.');
    expect(textOf(html)).not.toContain('You are the only moderator');
  });

  test('D6 all of it while it waits; what is held is released first', () => {
    const page = (review: Review): readonly boolean[] =>
      ['/approve"', '/send-back"', '/hold"', 'Release it'].map((way) => drawn(review).includes(way));
    const held = { ...aReview().amendment, state: 'held' as const };
    expect(page(aReview())).toEqual([true, true, true, false]);
    expect(page(aReview({ amendment: held }))).toEqual([false, true, false, true]);
    expect(page(aReview({ gaveIt: true, given: 1 }))).toEqual([false, true, true, false]);
  });

  test('whoever is alone is told that it will wait for a second', () => {
    expect(textOf(drawn(aReview({ othersLeft: 0 })))).toContain('You are the only moderator besides the author.');
    expect(textOf(drawn(aReview({ othersLeft: 0, needed: 1 })))).not.toContain('You are the only moderator');
    expect(textOf(drawn(aReview({ othersLeft: 0, given: 1, gaveIt: true })))).toContain(
      'No other moderator could give the second approval.',
    );
  });

  test('D7 a sheet that moved on is shown three ways, and only giving it back is left', () => {
    const row = { item: 'rules/xa-name', title: 'About xa-name', field: 'What to do', key: 'k', collides: true } as const;
    const stale = { from: 3, to: 4, rows: [{ ...row, was: 'A', now: 'B', mine: null }] };
    const html = drawn(aReview({ stale }));
    expect(textOf(html)).toMatch(/As it was As it now stands As proposed/);
    expect(textOf(html)).toMatch(/Both changed it .*A .*B .*not there/);
    expect([html.includes('/approve"'), html.includes('Give it back')]).toEqual([false, true]);
  });

  test('sources that are not ticked are named, each with the way back to it', () => {
    const html = renderToStaticMarkup(<ReadSources claims={aReview().claims} page={`/sorting-table/${ID}`} />);
    const [unread = '', read = ''] = html.split('Sources you have read');
    expect([unread.includes('About xa-lead'), unread.includes('About xa-name'), read.includes('About xa-name')]).toEqual([
      true,
      false,
      true,
    ]);
    expect(unread).toContain(`/sorting-table/${ID}#${claimAnchor('rules/xa-lead#0')}`);
  });
});

test('a remark can be tied to any changed rule, term, source, layer or trial piece, and to the parts of the sheet itself', () => {
  const all = comparison.items.flatMap(linesOf);
  expect(all).toEqual(['text', 'rules/xa-mark', 'rules/xa-name', 'rules/xa-lead', 'rules/xa-gone']);
});

describe('the sorting table', () => {
  const row: WaitingRow = {
    id: ID,
    region: 'xa',
    name: 'Land of xa',
    summary: 'Sellers give an address.',
    state: 'once-approved',
    sentAt: new Date('2026-11-30T23:59:00Z'),
    items: 3,
    rules: 2,
    needed: 2,
    given: 1,
    isOwn: true,
    openedBy: null,
    isStale: true,
  };

  test('says what waits, for how long, how much it is and what to mind', () => {
    expect(shownRow(row, NOW)).toMatchObject({
      waits: '1 day, sent on 30 November 2026',
      size: '3 items (2 rules)',
      state: 'one approval given',
      open: 'nobody',
      minds: [
        'limit, term, layer or fixed rule: two moderators',
        'one of two approvals given',
        'the sheet moved on since it was begun',
        'your own',
      ],
    });
  });

  const shown = (id: string): ShownRow => ({ ...shownRow(row, NOW), id });
  const table = (stamp: string, ...ids: string[]): ShownTable => ({ stamp, count: `${String(ids.length)} wait`, rows: ids.map(shown) });

  test('brought up to date, it counts what came and what went', () => {
    const before = liveTable(table('1', 'a', 'b'));
    expect(nextTable(before, table('1', 'a', 'b'), null)).toBe(before);
    const after = nextTable(before, table('2', 'c', 'a', 'd'), null);
    expect([after.said, after.rows.map(({ id }) => id), after.count]).toEqual([{ cameIn: 2, left: 1 }, ['c', 'a', 'd'], '3 wait']);
  });

  test('the row that has the focus stays until the next change, and is said to wait no longer', () => {
    const after = nextTable(liveTable(table('1', 'a', 'b')), table('2', 'a', 'c'), 'b');
    expect(after.rows.map(({ id, isGone }) => [id, isGone])).toEqual([
      ['a', false],
      ['b', true],
      ['c', false],
    ]);
    const later = nextTable(after, table('3', 'a', 'c'), 'a');
    expect([later.rows.map(({ id }) => id), later.said]).toEqual([['a', 'c'], { cameIn: 0, left: 0 }]);
  });
});
