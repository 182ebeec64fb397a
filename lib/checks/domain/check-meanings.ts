import { canonicalJson } from '@/lib/kernel/canonical-json';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Rule } from '@/lib/regions/domain/rule';
import { placeOfId } from './check-names';
import type { BothLines } from './compiled-days';
import { inRule, remark, type Finding, type FindingKind } from './finding';
import { compareMeaning, type RuleMeaning } from './meaning';
import type { Proposal } from './proposal-lines';

const KINDS: Readonly<Record<RuleMeaning['kind'], FindingKind>> = {
  added: 'meaning-added',
  withdrawn: 'meaning-withdrawn',
  same: 'meaning-same',
  changed: 'meaning-changed',
};

export type MeaningCheck = {
  readonly proposal: Proposal;
  readonly lines: BothLines;
  /** The day itself and those on which something that is changed begins or ends. */
  readonly days: readonly CalendarDate[];
  readonly below: readonly string[];
};

/**
 * C9: what each changed rule means otherwise, with a piece that shows it, in the place itself and in those below. Rules whose
 * words changed and whose meaning did not are told too.
 */
export function checkMeanings(check: MeaningCheck): readonly Finding[] {
  return [...meaningsHere(check), ...meaningsBelow(check)];
}

function meaningsHere({ proposal, lines, days }: MeaningCheck): readonly Finding[] {
  const { proposed, base } = proposal;
  const reworded = rewordedRules(proposed.rules, base?.rules ?? []);
  const told = days.flatMap((on) =>
    meaningsOn(lines, proposed.code, on)
      .filter(({ kind, rule }) => kind !== 'same' || reworded.has(rule))
      .map((meaning) => ({ ...meaning, on })),
  );
  const changed = new Set(told.filter(({ kind }) => kind !== 'same').map(({ rule }) => rule));
  return told
    .filter(({ kind, rule }) => kind !== 'same' || !changed.has(rule))
    .map(({ rule, kind, share, example, on }) => {
      const at = kind === 'withdrawn' ? inRule(rule, 'id') : placeOfId(proposed, rule, 'when');
      const finding = remark('C9', { at, kind: KINDS[kind], values: { rule, percent: share.percent, on } });
      return example === null ? finding : { ...finding, example: example.answers };
    });
}

/** One finding a rule, with every place below in which it means something else. */
function meaningsBelow({ proposal, lines, days, below }: MeaningCheck): readonly Finding[] {
  const places = new Map<string, Set<string>>();
  for (const code of below) {
    for (const { rule, kind } of days.flatMap((on) => meaningsOn(lines, code, on))) {
      if (kind !== 'same') places.set(rule, (places.get(rule) ?? new Set()).add(code));
    }
  }
  return [...places].map(([rule, codes]) =>
    remark('C9', {
      at: placeOfId(proposal.proposed, rule, 'when'),
      kind: 'meaning-changed-below',
      values: { rule, count: codes.size, regions: [...codes].join(', ') },
    }),
  );
}

/** Nothing where a version does not compile: the checks of that say so. */
function meaningsOn({ before, after }: BothLines, code: string, on: CalendarDate): readonly RuleMeaning[] {
  const meanings = compareMeaning({ before: before.input(code, on), after: after.input(code, on) });
  return meanings.ok ? meanings.value : [];
}

/** Rules that are in both sheets with another condition, other targets or other dates. */
function rewordedRules(now: readonly Rule[], before: readonly Rule[]): ReadonlySet<string> {
  const old = new Map(before.map((rule) => [rule.id, engineText(rule)]));
  return new Set(now.filter((rule) => old.has(rule.id) && old.get(rule.id) !== engineText(rule)).map(({ id }) => id));
}

const engineText = ({ kind, targets, alongside, when, from, to, order, firm }: Rule): string =>
  canonicalJson([kind, targets, alongside, when, from, to, order, firm]);
