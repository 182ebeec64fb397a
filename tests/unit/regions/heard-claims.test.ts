import { expect, test } from 'vitest';
import heard from '@/content/heard/claims.json';
import { heardClaims } from '@/lib/regions/heard-schema';
import { seedSheets } from '../../builders/seed-sheets';

const claims = heardClaims.parse(heard);
const rules = new Set([...seedSheets.values()].flatMap((sheet) => sheet.rules.map(({ id }) => id)));

test('REG-40 each claim one hears is held against rules that stand in a sheet', () => {
  expect(claims.length).toBeGreaterThan(13);
  expect(claims.flatMap(({ id, rules: named }) => named.filter((rule) => !rules.has(rule)).map((rule) => `${id}: ${rule}`))).toEqual([]);
});

test('REG-40 no claim stands twice, and the words of our answers are short enough to read', () => {
  expect(new Set(claims.map(({ id }) => id)).size).toBe(claims.length);
  const sentences = claims.flatMap(({ says, doNow }) => `${says} ${doNow}`.split(/(?<=[.?!])\s+/u));
  expect(sentences.filter((sentence) => sentence.split(/\s+/u).length > 30)).toEqual([]);
});
