import { err, ok, type Result } from '@/lib/kernel/result';
import { isInForce } from '@/lib/regions/domain/rule';
import type { CompileFault, EngineRule, LineInput } from './line-input';

export type RankedRule = { readonly rule: EngineRule; readonly layer: number };

/** Positions of rules in rank order, for each rule. */
export type Attacks = {
  /** The rules that attack it. */
  readonly on: readonly (readonly number[])[];
  /** The rules whose source is marked as disagreeing with its own. */
  readonly disagree: readonly (readonly number[])[];
};

/** The active rules: in force on the day and not excepted, by layer, then order, then id. */
export function rankRules({ layers, except, on }: Pick<LineInput, 'layers' | 'except' | 'on'>): readonly RankedRule[] {
  const excepted = new Set(except);
  return layers.flatMap(({ rules }, layer) =>
    rules
      .filter((rule) => isInForce(rule, on) && !excepted.has(rule.id))
      .sort((a, b) => a.order - b.order || (a.id < b.id ? -1 : 1))
      .map((rule) => ({ rule, layer })),
  );
}

/** Who attacks whom. Targets that are not active are passed over; an attack goes down in rank and spares firm rules above. */
export function readAttacks(ranked: readonly RankedRule[]): Result<Attacks, CompileFault> {
  const rankOf = new Map(ranked.map(({ rule }, rank) => [rule.id, rank]));
  const on = ranked.map((): number[] => []);
  for (const [attacker, from] of ranked.entries()) {
    for (const id of [...new Set(from.rule.targets)].sort()) {
      const rank = rankOf.get(id);
      if (rank === undefined) continue;
      const fault = faultOfAttack(from, ranked[rank], attacker > rank);
      if (fault !== null) return err({ kind: fault, in: from.rule.id, about: id });
      on[rank]?.push(attacker);
    }
  }
  return ok({ on, disagree: disagreements(ranked, on) });
}

function faultOfAttack(from: RankedRule, target: RankedRule | undefined, goesDown: boolean): CompileFault['kind'] | null {
  if (!goesDown) return 'attack-not-downwards';
  return target?.rule.firm === true && from.layer > target.layer ? 'attack-on-firm' : null;
}

/** Pairs that replace the same active target and of which at least one names the other as standing beside it. */
function disagreements(ranked: readonly RankedRule[], on: Attacks['on']): Attacks['disagree'] {
  const pairs = ranked.map(() => new Set<number>());
  for (const attackers of on) {
    const replacing = attackers.filter((rank) => ranked[rank]?.rule.kind === 'replaces');
    for (const a of replacing) {
      for (const b of replacing) {
        if (a !== b && (names(ranked[a], ranked[b]) || names(ranked[b], ranked[a]))) pairs[a]?.add(b);
      }
    }
  }
  return pairs.map((others) => [...others].sort((a, b) => a - b));
}

const names = (one: RankedRule | undefined, other: RankedRule | undefined): boolean =>
  one !== undefined && other !== undefined && one.rule.alongside.includes(other.rule.id);
