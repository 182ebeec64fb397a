import type { Collision, ThreeWayRow } from './amendment-view';
import { keysIn } from './changed-items';
import {
  contactWords,
  membershipWords,
  placeWordsOf,
  ruleWords,
  sourceWords,
  termWords,
  trialWords,
  type MemberWords,
} from './member-words';
import type { Contact, Sheet } from './sheet';
import { emptySheet, keyIn, type ItemKey, type ItemList } from './sheet-items';
import { collisionKey, fieldOutcomes, itemRows, mergedItem, type Choices, type Members, type Three } from './three-way';

/** The base is null for a change to a place that had no sheet. */
export type SheetsToMerge = { readonly base: Sheet | null; readonly now: Sheet; readonly mine: Sheet };

export type MergedSheets = {
  /** With every change of both sides; where they collide, by the choice, and as proposed where none is made. */
  readonly merged: Sheet;
  /** All places where both sides changed the same and not to the same, chosen or not. */
  readonly collisions: readonly Collision[];
};

/** Carries a change over to what came into use since it was begun. REG-55 nothing that either side changed is lost unsaid. */
export function mergeSheets(sheets: SheetsToMerge, choices: Choices = {}): MergedSheets {
  const three = threeOf(sheets);
  const { now } = three;
  const whole = <T extends Members>(item: ItemKey, read: (sheet: Sheet) => T): T => {
    const sides = { base: read(three.base), now: read(three.now), mine: read(three.mine) };
    return mergedItem<T>(item, sides, choices) ?? sides.now;
  };
  const facts = whole('text', ({ textFacts }) => ({ facts: textFacts }));
  const merged: Sheet = {
    ...now,
    ...whole('place', placeOf),
    ...whole('text', textOf),
    ...whole('gaps', gapsOf),
    textFacts: facts.facts,
    rules: mergedList(
      'rules',
      byId((sheet) => sheet.rules),
      three,
      choices,
    ),
    terms: mergedList(
      'terms',
      byId((sheet) => sheet.terms),
      three,
      choices,
    ),
    sources: mergedList(
      'sources',
      byId((sheet) => sheet.sources),
      three,
      choices,
    ),
    trials: mergedList(
      'trials',
      byId((sheet) => sheet.trials),
      three,
      choices,
    ),
    memberships: mergedList('memberships', memberships, three, choices),
    authorities: mergedList('authorities', contacts('authorities'), three, choices),
    accreditation: mergedList('accreditation', contacts('accreditation'), three, choices),
  };
  return { merged, collisions: collisionsOf(three) };
}

const threeOf = ({ base, now, mine }: SheetsToMerge): Three<Sheet> => ({ base: base ?? emptySheet(mine.code, '', mine.kind), now, mine });

const placeOf = ({ name, kind, languages }: Sheet) => ({ name, kind, languages });
const textOf = ({ text }: Sheet) => ({ text });
const gapsOf = ({ gaps }: Sheet) => ({ gaps });

/** The members of a list by what they are known by. */
type Read<T> = (sheet: Sheet) => ReadonlyMap<string, T>;

const byId =
  <T extends { readonly id: string }>(list: (sheet: Sheet) => readonly T[]): Read<T> =>
  (sheet) =>
    new Map(list(sheet).map((one) => [one.id, one]));
const memberships: Read<Sheet['memberships'][number]> = (sheet) => new Map(sheet.memberships.map((edge) => [edge.parent, edge]));

/** Contacts have no id: they are known by their name, and the second of one name as the second. */
const contacts =
  (list: 'authorities' | 'accreditation'): Read<Contact> =>
  (sheet) => {
    const found = new Map<string, Contact>();
    for (const one of sheet[list]) {
      const alike = [...found.values()].filter(({ name }) => name === one.name).length;
      found.set(alike === 0 ? one.name : `${one.name} ${String(alike + 1)}`, one);
    }
    return found;
  };

function mergedList<T extends Members>(list: ItemList, read: Read<T>, three: Three<Sheet>, choices: Choices): readonly T[] {
  const [base, now, mine] = [read(three.base), read(three.now), read(three.mine)];
  return orderOf(base, now, mine).flatMap((id) => {
    const sides = { base: base.get(id) ?? null, now: now.get(id) ?? null, mine: mine.get(id) ?? null };
    const made = mergedItem<T>(itemKey(list, id, three), sides, choices);
    return made === null ? [] : [made];
  });
}

type Ids = ReadonlyMap<string, unknown>;

/** The order of the side that changed it, mine first; what only the other side has follows what it followed there. */
function orderOf(base: Ids, now: Ids, mine: Ids): readonly string[] {
  const common = (side: Ids): string => [...side.keys()].filter((id) => base.has(id) && now.has(id) && mine.has(id)).join('\n');
  const [first, second] = common(now) === common(base) ? [mine, now] : [now, mine];
  const order = [...first.keys()];
  let last: string | null = null;
  for (const id of second.keys()) {
    if (!first.has(id)) order.splice(last === null ? 0 : order.indexOf(last) + 1, 0, id);
    last = id;
  }
  return order;
}

/** Contacts go by their place in what is proposed, or in what stands now. */
function itemKey(list: ItemList, id: string, { now, mine }: Three<Sheet>): ItemKey {
  if (list !== 'authorities' && list !== 'accreditation') return keyIn(list, id);
  const placeIn = (sheet: Sheet): number => [...contacts(list)(sheet).keys()].indexOf(id);
  const place = placeIn(mine) === -1 ? keysIn(mine, list).length + placeIn(now) : placeIn(mine);
  return keyIn(list, String(place + 1));
}

type Part = { readonly item: ItemKey; readonly sides: Three<Members | null>; readonly said: () => Three<Said | null> };
type Said = { readonly title: string; readonly words: MemberWords };

/** Every item of any of the three; its words are only made where they are told. */
function partsOf(three: Three<Sheet>): readonly Part[] {
  const sides = <T extends Members>(read: (sheet: Sheet) => T | null, say: (one: T, sheet: Sheet) => Said): Omit<Part, 'item'> => {
    const one = (sheet: Sheet): Said | null => {
      const found = read(sheet);
      return found === null ? null : say(found, sheet);
    };
    return {
      sides: { base: read(three.base), now: read(three.now), mine: read(three.mine) },
      said: () => ({ base: one(three.base), now: one(three.now), mine: one(three.mine) }),
    };
  };
  const listed = <T extends Members>(list: ItemList, read: Read<T>, say: (one: T, sheet: Sheet) => Said): readonly Part[] =>
    [...new Set([three.now, three.mine, three.base].flatMap((sheet) => [...read(sheet).keys()]))].map((id) => ({
      item: itemKey(list, id, three),
      ...sides((sheet) => read(sheet).get(id) ?? null, say),
    }));
  const place = (one: Sheet, said: MemberWords): Said => ({ title: one.name, words: said });
  return [
    { item: 'place', ...sides(placeOf, (_, sheet) => place(sheet, placeWordsOf(sheet))) },
    { item: 'text', ...sides(textOf, ({ text }, sheet) => place(sheet, { text })) },
    { item: 'gaps', ...sides(gapsOf, ({ gaps }, sheet) => place(sheet, { gaps: gaps.join('\n') })) },
    ...listed(
      'rules',
      byId((sheet) => sheet.rules),
      (rule, sheet) => ({ title: rule.title, words: ruleWords(rule, sheet) }),
    ),
    ...listed(
      'terms',
      byId((sheet) => sheet.terms),
      (term, sheet) => ({ title: term.name, words: termWords(term, sheet) }),
    ),
    ...listed(
      'sources',
      byId((sheet) => sheet.sources),
      (source) => ({ title: source.title, words: sourceWords(source) }),
    ),
    ...listed(
      'trials',
      byId((sheet) => sheet.trials),
      (trial) => ({ title: trial.title, words: trialWords(trial) }),
    ),
    ...listed('memberships', memberships, (edge) => ({ title: edge.parent.toUpperCase(), words: membershipWords(edge) })),
    ...listed('authorities', contacts('authorities'), (one) => ({ title: one.name, words: contactWords(one) })),
    ...listed('accreditation', contacts('accreditation'), (one) => ({ title: one.name, words: contactWords(one) })),
  ];
}

const collisionsOf = (three: Three<Sheet>): readonly Collision[] =>
  partsOf(three).flatMap(({ item, sides }) =>
    fieldOutcomes(sides)
      .filter(({ weighed }) => weighed === 'collides')
      .map(({ field }) => ({ key: collisionKey(item, field), item, field })),
  );

/** As it was, as it now stands, as proposed: every member that either side changed, in words. */
export const threeWayRows = (sheets: SheetsToMerge): readonly ThreeWayRow[] =>
  partsOf(threeOf(sheets)).flatMap(({ item, sides, said }) => itemRows(item, sides, said));
