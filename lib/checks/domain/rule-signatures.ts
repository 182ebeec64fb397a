import type { Place } from './line-input';
import type { ReadLine } from './line-build';
import type { Reading } from './condition-reading';

/** Gives the same short name to the same text, over several lines. */
class Names {
  private readonly known = new Map<string, string>();

  of(text: string): string {
    const name = this.known.get(text) ?? `#${this.known.size}`;
    this.known.set(text, name);
    return name;
  }
}

/** Two versions of a line with their names looked up. */
export type ReadVersions = { readonly earlier: ReadLine; readonly later: ReadLine };

/**
 * Ids of the rules of two versions that may mean something else, and of all rules these rest on. Whatever is written alike
 * through all its terms, attackers and rivals means the same and need not be compiled.
 */
export function rulesToBuild({ earlier, later }: ReadVersions, places: readonly (readonly Place[])[]): Rebuilt {
  const names = new Names();
  const [placesBefore = '', placesAfter = ''] = places.map((list) => names.of(JSON.stringify(list)));
  const was = signaturesOf(earlier, names, placesBefore);
  const is = signaturesOf(later, names, placesAfter);
  const differing = new Set([...was.keys(), ...is.keys()].filter((id) => was.get(id) !== is.get(id)));
  return { differing, needed: new Set([earlier, later].flatMap((line) => neededFor(line, differing))) };
}

export type Rebuilt = { readonly differing: ReadonlySet<string>; readonly needed: ReadonlySet<string> };

/** The line with those rules alone. What attacks one of them has to be among them. */
export function withOnly(line: ReadLine, kept: ReadonlySet<string>): ReadLine {
  const ranks = line.rules.flatMap(({ rule }, rank) => (kept.has(rule.id) ? rank : []));
  const newRank = new Map(ranks.map((rank, place) => [rank, place]));
  const among = (list: readonly number[]): readonly number[] => list.flatMap((rank) => newRank.get(rank) ?? []);
  const rules = ranks.flatMap((rank) => {
    const read = line.rules[rank];
    return read === undefined ? [] : [{ ...read, attackers: among(read.attackers), disagrees: among(read.disagrees) }];
  });
  return { ...line, rules };
}

/** What a rule rests on, as a name: its condition with its terms, then its attackers and rivals, each with all of theirs. */
function signaturesOf({ rules, terms }: ReadLine, names: Names, places: string): ReadonlyMap<string, string> {
  const termNames: string[] = [];
  for (const place of terms.inOrder) {
    const term = terms.list[place];
    if (term !== undefined) termNames[place] = names.of(textOf(term.reading, termNames));
  }
  const effective: string[] = [];
  const of = (ranks: readonly number[]): string => ranks.map((rank) => effective[rank] ?? '').join();
  for (const [fromTop, { reading, attackers }] of rules.toReversed().entries()) {
    effective[rules.length - 1 - fromTop] = names.of(`${places} ${textOf(reading, termNames)} unless ${of(attackers)}`);
  }
  return new Map(rules.map(({ rule, disagrees }, rank) => [rule.id, `${effective[rank] ?? ''} beside ${of(disagrees)}`]));
}

function textOf(reading: Reading, terms: readonly string[]): string {
  switch (reading.kind) {
    case 'always':
      return String(reading.holds);
    case 'test':
      return JSON.stringify(reading.leaf);
    case 'term':
      return terms[reading.term] ?? '';
    case 'not':
      return `not(${textOf(reading.part, terms)})`;
    case 'all':
    case 'any':
      return `${reading.kind}(${reading.parts.map((part) => textOf(part, terms)).join()})`;
  }
}

/** The rules themselves, their rivals, and whatever attacks any of these, all the way up. */
function neededFor({ rules }: ReadLine, ids: ReadonlySet<string>): readonly string[] {
  const own = rules.flatMap(({ rule, disagrees }, rank) => (ids.has(rule.id) ? [rank, ...disagrees] : []));
  const needed = new Set(own);
  for (const rank of needed) for (const attacker of rules[rank]?.attackers ?? []) needed.add(attacker);
  return [...needed].flatMap((rank) => rules[rank]?.rule.id ?? []);
}
