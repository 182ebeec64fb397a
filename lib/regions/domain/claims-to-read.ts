import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { ClaimToRead } from './amendment-view';
import type { Citation, Rule, Term } from './rule';
import type { Sheet } from './sheet';
import { keyIn, type ItemKey } from './sheet-items';

/** A use of a source, without what is known only of a reader. */
export type Claim = Omit<ClaimToRead, 'fileId' | 'isRead'>;

type Claiming = Rule | Term;

/** The uses of sources that a moderator reads before approving: all those of every rule and term that is added or changed. */
export function claimsToRead(base: Sheet | null, proposed: Sheet): readonly Claim[] {
  return claimingItems(base, proposed).flatMap(({ item, is }) =>
    is.sources.flatMap((citation, index) => {
      const source = proposed.sources.find(({ id }) => id === citation.source);
      const title = 'title' in is ? is.title : is.name;
      return source === undefined ? [] : [{ key: claimKey(item, index), item, title, says: is.says, citation, source }];
    }),
  );
}

/** `rules/dk-register#0`: the first use of a source by that rule. */
export const claimKey = (item: ItemKey, index: number): string => `${item}#${String(index)}`;

type Pair = { readonly item: ItemKey; readonly was: Claiming | null; readonly is: Claiming };

function claimingItems(base: Sheet | null, proposed: Sheet): readonly Pair[] {
  const pairs = (list: 'rules' | 'terms'): readonly Pair[] => {
    const before = new Map((base?.[list] ?? []).map((one: Claiming) => [one.id, one]));
    return proposed[list].map((is) => ({ item: keyIn(list, is.id), was: before.get(is.id) ?? null, is }));
  };
  return [...pairs('rules'), ...pairs('terms')].filter(({ was, is }) => was === null || canonicalJson(was) !== canonicalJson(is));
}

/**
 * REG-54 Claims that lack the passage they rest on: of a rule or term that is added or that claims something else than before, where no
 * text it cites is quoted; and every newly cited text that is not quoted. Common practice has no text to quote.
 */
export function claimsWithoutPassage(base: Sheet | null, proposed: Sheet): readonly string[] {
  return claimingItems(base, proposed).flatMap(({ item, was, is }) => {
    if (is.sources.length === 0) return [claimKey(item, 0)];
    const before = new Set((was?.sources ?? []).map((citation) => canonicalJson(citation)));
    const missing = is.sources.flatMap((citation, index) => (wantsPassage(citation) ? [{ citation, key: claimKey(item, index) }] : []));
    const isQuoted = is.sources.some((citation) => !wantsPassage(citation));
    const isAnew = was === null || claimOf(was) !== claimOf(is);
    if (isAnew && !isQuoted) return missing.map(({ key }) => key);
    return missing.filter(({ citation }) => !before.has(canonicalJson(citation))).map(({ key }) => key);
  });
}

const wantsPassage = ({ standing, passage }: Citation): boolean => standing !== 'common-practice' && passage === undefined;

const claimOf = (item: Claiming): string =>
  canonicalJson('payload' in item ? [item.says, item.when, item.strength, item.payload] : [item.says, item.when]);
