import { expect, test } from 'vitest';
import { newPlaceInput } from '@/lib/regions/amendment-schema';
import { approvalsNeeded } from '@/lib/regions/domain/approval';
import { changedItems, touchedByBoth } from '@/lib/regions/domain/changed-items';
import { claimsToRead, claimsWithoutPassage } from '@/lib/regions/domain/claims-to-read';
import { followedBy, nextVersion } from '@/lib/regions/domain/entry-versions';
import { faultsAt, fitItem, keysCiting, restoredItem } from '@/lib/regions/domain/fitted-item';
import { itemOf, withItem, withoutItem } from '@/lib/regions/domain/sheet-items';
import { sheetDocument } from '@/lib/regions/schema';
import { seedSheets } from '../../builders/seed-sheets';
import { aLimit, aRule, aSheet, aSource } from '../../builders/small-world';

const base = aSheet('xa', { rules: [aRule('xa-one'), aRule('xa-two'), aRule('xa-three')] });

test('REG-52 a limit, a term, a fixed rule or a layer wants two moderators, all else one', () => {
  const term = {
    id: 'xa-flat',
    region: 'xa',
    name: 'Flat',
    says: 'Flat ware.',
    category: true,
    when: true,
    from: null,
    to: null,
    sources: [],
    facts: [],
  };
  const limited = { ...base, rules: [...base.rules, aLimit('xa-pb', 2)] };
  expect(approvalsNeeded(base, base)).toBe(1);
  expect(approvalsNeeded(base, { ...base, text: 'Other.', rules: [aRule('xa-one', { says: 'Other.' })] })).toBe(1);
  expect(approvalsNeeded(base, limited)).toBe(2);
  expect(approvalsNeeded(base, { ...base, kind: 'bloc' })).toBe(2);
  expect(approvalsNeeded(limited, base)).toBe(2);
  expect(approvalsNeeded(limited, { ...base, rules: [...base.rules, aLimit('xa-pb', 1)] })).toBe(2);
  expect(approvalsNeeded(limited, { ...limited, text: 'Other.' })).toBe(1);
  expect(approvalsNeeded(base, { ...base, terms: [term] })).toBe(2);
  expect(approvalsNeeded(base, { ...base, rules: base.rules.map((rule) => ({ ...rule, firm: true })) })).toBe(2);
  const edge = { parent: 'eu', from: null, to: null, except: [] };
  expect(
    approvalsNeeded(
      { ...base, memberships: [edge] },
      { ...base, memberships: [{ ...edge, except: [{ rule: 'eu-pb-cat1', why: 'No.' }] }] },
    ),
  ).toBe(2);
  expect(approvalsNeeded(null, { ...base, memberships: [edge] })).toBe(2);
});

test('REG-62 what differs from the base is named item by item, and what two amendments both touch', () => {
  const proposed = { ...base, text: 'Other.', rules: [aRule('xa-one', { says: 'Other.' }), aRule('xa-three'), aRule('xa-four')] };
  expect(changedItems(base, proposed).map(({ item, change }) => `${item} ${change}`)).toEqual([
    'text changed',
    'rules/xa-one changed',
    'rules/xa-four added',
    'rules/xa-two withdrawn',
  ]);
  expect(changedItems(base, base)).toEqual([]);
  const other = { ...base, rules: base.rules.map((rule) => (rule.id === 'xa-one' ? { ...rule, title: 'Other' } : rule)) };
  expect(touchedByBoth(changedItems(base, proposed), changedItems(base, other))).toEqual(['rules/xa-one']);
});

test('REG-54 claims to read are those of all that is added or changed; one without a passage is named', () => {
  const bare = aRule('xa-four', { sources: [{ source: 'xa-text', standing: 'guidance', evidence: 'read' }] });
  const proposed = { ...base, rules: [...base.rules.slice(0, 2), aRule('xa-three', { title: 'Other' }), bare] };
  expect(claimsToRead(base, proposed).map(({ key }) => key)).toEqual(['rules/xa-three#0', 'rules/xa-four#0']);
  expect(claimsWithoutPassage(base, proposed)).toEqual(['rules/xa-four#0']);
  // Founding claims may lack theirs, for as long as nothing else is claimed.
  const founding = { ...base, rules: [bare] };
  expect(claimsWithoutPassage(founding, { ...base, rules: [{ ...bare, title: 'Other' }] })).toEqual([]);
  expect(claimsWithoutPassage(founding, { ...base, rules: [{ ...bare, says: 'Other.' }] })).toEqual(['rules/xa-four#0']);
  const second = { source: 'xa-text', locator: 'section 9', standing: 'guidance', evidence: 'read' } as const;
  expect(claimsWithoutPassage(founding, { ...base, rules: [{ ...bare, sources: [...bare.sources, second] }] })).toEqual([
    'rules/xa-four#1',
  ]);
  const practice = aRule('xa-five', { standing: 'common-practice', sources: [{ ...second, standing: 'common-practice' }] });
  expect(claimsWithoutPassage(base, { ...base, rules: [practice] })).toEqual([]);
  const term = {
    id: 'xa-flat',
    region: 'xa',
    name: 'Flat',
    says: 'Flat.',
    category: false,
    when: true,
    from: null,
    to: null,
    sources: [],
    facts: [],
  };
  expect(claimsWithoutPassage(base, { ...base, terms: [term] })).toEqual(['terms/xa-flat#0']);
});

test('REG-62 an item is put where its form stands; an id that is taken or for ever is refused', () => {
  const item = { list: 'rules', value: aRule('xa-new') } as const;
  const added = fitItem(base, 'rules/new', { item, base });
  expect(added).toMatchObject({ ok: true, value: { key: 'rules/xa-new' } });
  const taken = { list: 'rules', value: aRule('xa-two') } as const;
  expect(fitItem(base, 'rules/new', { item: taken, base })).toMatchObject({ ok: false, error: { id: expect.any(String) as string } });
  expect(fitItem(base, 'rules/xa-one', { item, base })).toMatchObject({ ok: false, error: { id: expect.any(String) as string } });
  const place = { list: 'place', value: { name: 'Land', kind: 'base', languages: [] } } as const;
  expect(fitItem(base, 'place', { item: place, base })).toMatchObject({ ok: false, error: { kind: expect.any(String) as string } });
  const contact = { list: 'authorities', value: { name: 'Office', url: null, role: 'Asks', evidence: 'read' } } as const;
  expect(fitItem(base, 'authorities/9', { item: contact, base })).toMatchObject({ ok: true, value: { key: 'authorities/1' } });
});

test('REG-62 what the schema refuses stands at the field of the item, and all else at the form', () => {
  const rules = [aRule('xa-one', { title: '', sources: [{ source: 'nowhere', standing: 'guidance', evidence: 'read' }] }), aRule('xa-two')];
  const parsed = sheetDocument.safeParse({ ...base, rules, text: '' });
  if (parsed.success) throw new Error('It was let through');
  const faults = faultsAt({ sheet: { ...base, rules, text: '' }, key: 'rules/xa-one' }, parsed.error.issues);
  expect(Object.keys(faults).sort()).toEqual(['form', 'sources.0.source', 'title']);
  expect(keysCiting(base, 'sources/xa-text')).toEqual(['rules/xa-one', 'rules/xa-two', 'rules/xa-three']);
});

test('REG-62 what is put back stands where it stood; of every item of every founding sheet', () => {
  for (const sheet of seedSheets.values()) {
    for (const rule of sheet.rules) {
      const key = `rules/${rule.id}` as const;
      expect(restoredItem(sheet, withoutItem(sheet, key), key)).toEqual(sheet);
      const mended = withItem(sheet, key, { list: 'rules', value: { ...rule, says: 'Other.' } });
      expect(restoredItem(sheet, mended, key)).toEqual(sheet);
    }
    for (const { parent } of sheet.memberships) {
      const key = `memberships/${parent}` as const;
      expect(restoredItem(sheet, withoutItem(sheet, key), key)).toEqual(sheet);
    }
  }
  const added = { ...base, sources: [aSource, { ...aSource, id: 'xa-other' }] };
  expect(restoredItem(base, added, 'sources/xa-other')).toEqual(base);
  expect(itemOf(restoredItem(null, added, 'sources/xa-other'), 'sources/xa-other')).toBeNull();
});

test('REG-57 an entry follows the version it was typed over, and a new one is never taken for an old one', () => {
  const entry = { item: 'text', version: 20_003, values: { text: 'a' }, savedAt: new Date(0) } as const;
  expect(followedBy(entry, 20_003)).toEqual({ ok: true, value: null });
  expect(followedBy(entry, 20_002)).toMatchObject({ ok: false, error: { kind: 'entry-moved-on', version: 20_003, values: { text: 'a' } } });
  expect(followedBy(null, 20_003)).toMatchObject({ ok: false, error: { values: null, version: 0 } });
  expect(nextVersion(entry, 2)).toBe(20_004);
  expect(nextVersion(null, 3)).toBeGreaterThan(nextVersion(entry, 2));
});

/** Beside each name as it was typed what is kept of it; null where it is refused. */
const NAMES: readonly (readonly [typed: string, kept: string | null])[] = [
  ['Denmark', 'Denmark'],
  ['  Denmark  ', 'Denmark'],
  ['Côte d’Ivoire', 'Côte d’Ivoire'],
  ['Co\u0302te d’Ivoire', 'Côte d’Ivoire'],
  ['Åland', 'Åland'],
  ['A\u030aland', 'Åland'],
  ['\u212bland', 'Åland'],
  ['日本', '日本'],
  ['Ελλάδα', 'Ελλάδα'],
  ['مصر', 'مصر'],
  ['Việt Nam', 'Việt Nam'],
  ['Vie\u0323\u0302t Nam', 'Việt Nam'],
  ['New\u00a0Zealand', 'New Zealand'],
  ['New\u2003Zealand', 'New Zealand'],
  ['New   Zealand', 'New Zealand'],
  ['New\tZealand', 'New Zealand'],
  ['New\nZealand', 'New Zealand'],
  ['New\r\nZealand', 'New Zealand'],
  ['New\u2028Zealand', 'New Zealand'],
  ['New\u2029Zealand', 'New Zealand'],
  ['Den\u0000mark', 'Den mark'],
  ['Den\u0007mark', 'Den mark'],
  ['Den\u001b[31mmark', 'Den [31mmark'],
  ['Den\u007fmark', 'Den mark'],
  ['Den\u0085mark', 'Den mark'],
  ['Denmark\u202e', 'Denmark'],
  ['\u202eDenmark', 'Denmark'],
  ['\u2066Denmark\u2069', 'Denmark'],
  ['\u200fDenmark\u200e', 'Denmark'],
  ['\u061cDenmark', 'Denmark'],
  ['\u200bDenmark', 'Denmark'],
  ['Denmark\u200d', 'Denmark'],
  ['\ufeffDenmark', 'Denmark'],
  ['Denmark\u00ad', 'Denmark'],
  ['Denmark\ud800', 'Denmark'],
  ['Denmark\ue000', 'Denmark'],
  ['\u3164', null],
  ['\u200b\u200c\u2060', null],
  ['', null],
  ['   ', null],
  ['x'.repeat(81), null],
  ['<b>Denmark</b>', '<b>Denmark</b>'],
];

test.each(NAMES)('REG-61 S41 the name of a place: %j is kept as %j', (typed, kept) => {
  const parsed = newPlaceInput.safeParse({
    key: '0192f0c1-2d3e-7a4b-8c5d-6e7f80910213',
    region: 'zz',
    name: typed,
    kind: 'country',
    languages: 'en',
    parent: '',
    text: 'New.',
  });
  expect(parsed.success ? parsed.data.name : null).toBe(kept);
});

test('REG-61 S41 a code of a place is plain letters and digits, whatever looks like one', () => {
  for (const region of ['DK', 'd', 'dk ', 'dk\u200b', 'ԁk', 'd\u0131', 'dk/..', 'dk-', '../dk', 'dk\u0000']) {
    expect(newPlaceInput.shape.region.safeParse(region).success, region).toBe(false);
  }
});
