import { canonicalJson, type Json } from '@/lib/kernel/canonical-json';
import { words } from '@/lib/kernel/words';
import type { FieldName } from './field-difference';
import type { MemberWords } from './member-words';
import type { ThreeWayRow } from './amendment-view';
import type { ItemKey } from './sheet-items';

/** One thing in three versions: as it was when the change was begun, as it stands now, and as it is proposed. */
export type Three<T> = { readonly base: T; readonly now: T; readonly mine: T };

/** A member of a sheet as JSON holds it. */
export type Members = { readonly [name: string]: Json };

/** Whose version is to stand where both changed it, by `Collision.key`. */
export type Choices = Readonly<Record<string, 'mine' | 'now'>>;

/** Stands for the whole item: it is there or not. */
export const WHOLE = '*';
export const collisionKey = (item: ItemKey, field: string): string => `${item} ${field}`;

const same = (a: Json | undefined, b: Json | undefined): boolean =>
  a === undefined || b === undefined ? a === b : canonicalJson(a) === canonicalJson(b);

export type Weighed = 'same' | 'now' | 'mine' | 'collides';

/** Which side changed it; `same` where nobody did, or both to the same. */
export function weigh({ base, now, mine }: Three<Json | undefined>): Weighed {
  if (same(now, mine)) return 'same';
  if (same(base, mine)) return 'now';
  return same(base, now) ? 'mine' : 'collides';
}

/** What nobody writes by hand: where both sides have another, what stands now is kept. */
const SILENT: ReadonlySet<string> = new Set(['id', 'region', 'parent', 'order', 'facts']);

export type FieldOutcome = { readonly field: string; readonly weighed: Weighed };

/** Every member of an item that is there in what stands now and in what is proposed. */
export function fieldOutcomes({ base, now, mine }: Three<Members | null>): readonly FieldOutcome[] {
  if (now === null || mine === null) {
    const weighed = weigh({ base: base ?? undefined, now: now ?? undefined, mine: mine ?? undefined });
    return [{ field: WHOLE, weighed }];
  }
  const fields = [...new Set([...Object.keys(now), ...Object.keys(mine)])];
  return fields.map((field) => {
    const weighed = weigh({ base: base?.[field], now: now[field], mine: mine[field] });
    return { field, weighed: weighed === 'collides' && SILENT.has(field) ? 'now' : weighed };
  });
}

/** The item with what each side changed, or null when it is to go; where both did, by the choice, and mine where none is made. */
export function mergedItem<T extends Members>(item: ItemKey, three: Three<T | null>, choices: Choices): T | null {
  const { now, mine } = three;
  const takesMine = ({ field, weighed }: FieldOutcome): boolean =>
    weighed === 'mine' || (weighed === 'collides' && choices[collisionKey(item, field)] !== 'now');
  const outcomes = fieldOutcomes(three);
  if (now === null || mine === null) return outcomes.some(takesMine) ? mine : now;
  return joined(
    now,
    mine,
    outcomes.filter(takesMine).map(({ field }) => field),
  );
}

function joined<T extends Members>(now: T, mine: T, fields: readonly string[]): T {
  const taken = fields.flatMap((field) => (mine[field] === undefined ? [] : [[field, mine[field]] as const]));
  const made = { ...now, ...Object.fromEntries(taken) };
  for (const field of fields) if (mine[field] === undefined) Reflect.deleteProperty(made, field);
  return made;
}

type Said = { readonly title: string; readonly words: MemberWords };

/** The rows of one item: each member that either side changed, in words. */
export function itemRows(item: ItemKey, three: Three<Members | null>, say: () => Three<Said | null>): readonly ThreeWayRow[] {
  const touched = fieldOutcomes(three)
    .filter(({ field, weighed }) => !isUntouched(three, field, weighed))
    .sort((a, b) => rankOf(a.field) - rankOf(b.field));
  if (touched.length === 0) return [];
  const said = say();
  const title = (said.mine ?? said.now ?? said.base)?.title ?? item;
  const cell = (side: Said | null, field: string): string | null => {
    if (side === null) return null;
    return field === WHOLE ? side.title : (side.words[field] ?? '');
  };
  return touched.flatMap(({ field, weighed }) => {
    const isTold = field === WHOLE || [said.base, said.now, said.mine].some((side) => side?.words[field] !== undefined);
    if (!isTold) return [];
    const collides = weighed === 'collides';
    const cells = { was: cell(said.base, field), now: cell(said.now, field), mine: cell(said.mine, field) };
    return [{ item, title, field: fieldWords(field), ...cells, collides, key: collides ? collisionKey(item, field) : null }];
  });
}

/** Neither side touched it; where both changed it to the same, it is worth a row. */
const isUntouched = ({ base, now, mine }: Three<Members | null>, field: string, weighed: Weighed): boolean =>
  weighed === 'same' && (field === WHOLE || (now !== null && mine !== null && same(base?.[field], now[field])));

const FIELD_WORDS: Readonly<Record<string, FieldName>> = {
  [WHOLE]: 'title',
  title: 'title',
  says: 'says',
  when: 'when',
  kind: 'kind',
  targets: 'targets',
  alongside: 'alongside',
  from: 'dates',
  to: 'dates',
  firm: 'firm',
  strength: 'strength',
  standing: 'standing',
  payload: 'detail',
  sources: 'source',
  lookAgainBy: 'lookAgainBy',
  note: 'note',
  name: 'name',
  category: 'category',
  publisher: 'publisher',
  identifier: 'identifier',
  url: 'url',
  versionDate: 'versionDate',
  seenOn: 'seenOn',
  seenVia: 'seenVia',
  fingerprint: 'fingerprint',
  role: 'role',
  evidence: 'evidence',
  except: 'except',
  on: 'on',
  answers: 'answers',
  declined: 'declined',
  expected: 'expected',
  languages: 'languages',
  text: 'text',
  gaps: 'gaps',
};

/** Fields are told in the order above, however the document has them. */
const RANKS = Object.keys(FIELD_WORDS);
const rankOf = (field: string): number => RANKS.indexOf(field);

const fieldWords = (field: string): string => words(`editions.field.${FIELD_WORDS[field] ?? 'detail'}`);
