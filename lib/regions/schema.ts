import { z } from 'zod';
import { condition } from './condition-schema';
import type { Rule } from './domain/rule';
import type { Sheet } from './domain/sheet';
import { payload } from './payload-schema';
export { calendarDate, regionCode } from '@/lib/kernel/shapes';
import { calendarDate, evidence, lang, regionCode, slug, words } from '@/lib/kernel/shapes';

const openDate = calendarDate.nullable().default(null);
const standing = z.enum(['law', 'guidance', 'standard', 'lab', 'common-practice']);

export const source = z.strictObject({
  id: slug,
  title: words,
  publisher: words,
  identifier: words.exactOptional(),
  url: z.url().exactOptional(),
  versionDate: words.exactOptional(),
  seenOn: calendarDate.exactOptional(),
  seenVia: words.exactOptional(),
  fingerprint: z
    .strictObject({ sha256: z.string().regex(/^[0-9a-f]{64}$/), type: words.max(100), bytes: z.int().positive() })
    .exactOptional(),
});

const citation = z
  .strictObject({
    source: slug,
    locator: words.exactOptional(),
    passage: words.exactOptional(),
    passageLang: lang.exactOptional(),
    standing,
    evidence,
  })
  .refine((it) => (it.passage === undefined) === (it.passageLang === undefined), { error: 'A passage needs its language, passageLang' });

export const rule = z
  .strictObject({
    id: slug,
    region: regionCode,
    kind: z.enum(['adds', 'replaces', 'excepts']),
    targets: z.array(slug).default([]),
    alongside: z.array(slug).default([]),
    when: condition,
    from: openDate,
    to: openDate,
    order: z.int(),
    firm: z.boolean().default(false),
    strength: z.enum(['must', 'should', 'may', 'note']),
    standing,
    title: words.max(120),
    says: words.max(1200),
    payload,
    sources: z.array(citation).min(1, 'Every rule needs a source'),
    facts: z.array(slug).default([]),
    lookAgainBy: calendarDate,
    note: words.exactOptional(),
  })
  .superRefine((it, ctx) => {
    for (const [path, message] of [...faultsOfSpan(it), ...faultsOfStanding(it)]) ctx.addIssue({ code: 'custom', path: [path], message });
  });

type Fault = readonly [field: string, message: string];

function faultsOfSpan({ kind, targets, from, to }: Pick<Rule, 'kind' | 'targets' | 'from' | 'to'>): readonly Fault[] {
  const faults: Fault[] = [];
  if ((kind === 'adds') !== (targets.length === 0))
    faults.push(['targets', 'Only rules that replace or except have targets, and those need one']);
  if (from !== null && to !== null && from >= to) faults.push(['to', 'The end must come after the start']);
  return faults;
}

/** What a strength may rest on (product rule H2). */
function faultsOfStanding({
  strength,
  standing,
  sources,
  when,
}: Pick<Rule, 'strength' | 'standing' | 'sources' | 'when'>): readonly Fault[] {
  const [first] = sources;
  const wasRead = first?.evidence === 'read';
  const checks: readonly (readonly [wrong: boolean, ...fault: Fault])[] = [
    [first?.standing !== standing, 'standing', 'The standing is that of the first source'],
    [strength === 'must' && !(standing === 'law' && wasRead), 'strength', 'A must needs law that was read'],
    [standing === 'common-practice' && strength !== 'note', 'strength', 'Common practice has strength "note"'],
    [standing === 'common-practice' && when !== true, 'when', 'Common practice applies always'],
  ];
  return checks.flatMap(([wrong, field, message]): readonly Fault[] => (wrong ? [[field, message]] : []));
}

export const term = z.strictObject({
  id: slug,
  region: regionCode,
  name: words,
  says: words,
  category: z.boolean().default(false),
  when: condition,
  from: openDate,
  to: openDate,
  sources: z.array(citation).default([]),
  facts: z.array(slug).default([]),
});

export const trial = z.strictObject({
  id: slug,
  title: words.max(120),
  on: calendarDate,
  answers: z.record(slug, z.json()),
  declined: z.array(slug).default([]),
  expected: z
    .record(slug, z.enum(['applies', 'does-not-apply', 'not-settled', 'treat-as-applying', 'sources-disagree']))
    .refine((it) => Object.keys(it).length > 0, { error: 'A trial piece expects something of one rule at least' }),
});

export const contact = z.strictObject({ name: words, url: z.url().nullable(), role: words, evidence });

export const membership = z.strictObject({
  parent: regionCode,
  from: openDate,
  to: openDate,
  except: z.array(z.strictObject({ rule: slug, why: words })).default([]),
});

/** The document of a sheet: what a seed file holds and what an edition keeps. Fills in defaults; refuses unknown members. */
export const sheetDocument = z
  .strictObject({
    code: regionCode,
    name: words,
    kind: z.enum(['bloc', 'country', 'part', 'standard', 'base']),
    languages: z.array(lang),
    memberships: z.array(membership).default([]),
    text: words,
    textFacts: z.array(slug).default([]),
    authorities: z.array(contact),
    accreditation: z.array(contact),
    gaps: z.array(words).default([]),
    sources: z.array(source),
    terms: z.array(term).default([]),
    rules: z.array(rule),
    trials: z.array(trial).default([]),
    leftOut: z.array(z.strictObject({ fact: slug, why: words })).default([]),
  })
  .superRefine((sheet, ctx) => {
    const say = (path: PropertyKey[], message: string) => {
      ctx.addIssue({ code: 'custom', path, message });
    };
    const known = new Set(sheet.sources.map(({ id }) => id));
    const seen = new Set<string>();
    const lists = [
      ['rules', sheet.rules],
      ['terms', sheet.terms],
    ] as const;
    for (const [list, items] of lists) {
      items.forEach((item, index) => {
        if (item.region !== sheet.code) say([list, index, 'region'], `This sheet is of "${sheet.code}"`);
        if (seen.has(item.id)) say([list, index, 'id'], `"${item.id}" stands here twice`);
        seen.add(item.id);
        item.sources.forEach((cited, place) => {
          if (!known.has(cited.source))
            say([list, index, 'sources', place, 'source'], `There is no source "${cited.source}" in this sheet`);
        });
      });
    }
  }) satisfies z.ZodType<Sheet>;
