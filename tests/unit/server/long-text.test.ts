import { describe, expect, test } from 'vitest';
import { z } from 'zod';
import * as accounts from '@/lib/accounts/schema';
import * as stewards from '@/lib/accounts/steward-schema';
import { readEmailText } from '@/lib/accounts/domain/email-address';
import { nextPlace } from '@/lib/accounts/domain/next-place';
import { nameFault, tidyName } from '@/lib/accounts/domain/person-name';
import { namesPerson } from '@/lib/accounts/domain/public-reason';
import { dayBookQuery } from '@/lib/day-book/schema';
import { parseCalendarDate } from '@/lib/kernel/calendar-date';
import { millionths } from '@/lib/kernel/quantity';
import { readPasted } from '@/lib/readings/domain/pasted-rows';
import * as amendments from '@/lib/regions/amendment-schema';
import { linksIn, tidyWords } from '@/lib/regions/domain/doubt';
import { foldText } from '@/lib/regions/domain/region-search';
import { splitText } from '@/lib/regions/domain/sheet-reading';
import { textDifference } from '@/lib/regions/domain/text-difference';
import * as doubts from '@/lib/regions/doubt-schema';
import { indexWords } from '@/lib/search/domain/index-words';
import { readWords } from '@/lib/search/domain/read-words';
import { searchParameters } from '@/lib/search/schema';
import { cpuOf, LONG } from '../../builders/hostile-text';

/** Every field that any of these forms has. A schema takes those of its own and is asked of each. */
const FIELDS = [
  ...[
    'key',
    'id',
    'email',
    'name',
    'password',
    'current',
    'token',
    'code',
    'next',
    'handle',
    'region',
    'currency',
    'units',
    'why',
    'regions',
  ],
  ...[
    'reason',
    'answer',
    'said',
    'role',
    'from',
    'q',
    'after',
    'secret',
    'kind',
    'languages',
    'parent',
    'text',
    'item',
    'version',
    'values',
  ],
  ...['summary', 'intended', 'choices', 'claim', 'line', 'words', 'remark', 'number', 'rule', 'elsewhere', 'link', 'homepage', 'stamp'],
  ...['state', 'days', 'keeper', 'page', 'until', 'sort', 'before', 'limit'],
];

const SCHEMAS: readonly (readonly [string, z.ZodType])[] = Object.entries({
  ...accounts,
  ...stewards,
  ...amendments,
  ...doubts,
  dayBookQuery,
  searchParameters,
}).flatMap(([name, schema]) => (schema instanceof z.ZodType ? [[name, schema] as const] : []));

/** What takes a text as somebody typed it, before or behind a door. */
const READERS: Readonly<Record<string, (text: string) => unknown>> = {
  readEmailText,
  nextPlace: (text) => nextPlace(text, '/'),
  tidyName,
  nameFault: (text) => nameFault(tidyName(text)),
  namesPerson: (text) => namesPerson(text.slice(0, 2000), 'Mara Lindqvist'),
  parseCalendarDate,
  millionths: (text) => millionths(text, 'mm'),
  readPasted,
  linksIn: (text) => linksIn([text]),
  tidyWords,
  foldText,
  splitText,
  textDifference: (text) => textDifference(text, text.slice(7)),
  'textDifference, shuffled': (text) => textDifference(text.slice(0, 20_000), `x ${text.slice(0, 10_000)} y ${text.slice(3, 10_000)}`),
  indexWords,
  readWords,
};

/** The slowest of all, in a line; and those that took longer than anybody would call "does not hang". */
function judge(took: readonly (readonly [name: string, ms: number])[]): readonly (readonly [string, number])[] {
  const slowest = took.toSorted(([, a], [, b]) => b - a).slice(0, 3);
  process.stdout.write(`Slowest, ms of processor time: ${slowest.map(([name, ms]) => `${name} ${ms.toFixed(0)}`).join(', ')}\n`);
  return took.filter(([, ms]) => ms > 2000);
}

describe('S37 fifty thousand characters of a kind', () => {
  test.each(Object.entries(READERS))('%s reads or refuses them without hanging', (name, read) => {
    expect(judge(Object.entries(LONG).map(([kind, text]) => [`${name}: ${kind}`, cpuOf(() => void read(text))]))).toEqual([]);
  });

  test('in any field of any form are read or refused without hanging', () => {
    expect(SCHEMAS.length).toBeGreaterThan(40);
    const took = SCHEMAS.flatMap(([name, schema]) =>
      Object.entries(LONG).map(([kind, text]) => {
        const filled = Object.fromEntries(FIELDS.map((field) => [field, text]));
        return [
          `${name}: ${kind}`,
          cpuOf(() => {
            for (const given of [filled, text, [text]]) schema.safeParse(given);
          }),
        ] as const;
      }),
    );
    expect(judge(took)).toEqual([]);
  });
});
