/**
 * A second, slow and simple reading of the rules: two-valued, over whole worlds, by trying every one of them. It shares
 * nothing with the engine, no table, no type and no number, so that no mistake can be made in both.
 */

type Json = Readonly<Record<string, unknown>>;

type AskedQuestion = {
  readonly id: string;
  readonly kind: string;
  readonly options?: readonly string[];
  readonly unit?: string;
  readonly askIf?: { readonly question: string; readonly in: readonly string[] };
};

type Dated = { readonly id: string; readonly when: unknown; readonly from: string | null; readonly to: string | null };
type WrittenRule = Dated & {
  readonly kind: string;
  readonly targets: readonly string[];
  readonly alongside: readonly string[];
  readonly order: number;
};
type WrittenPlace = { readonly code: string; readonly line: readonly string[] };
type WrittenLayer = { readonly rules: readonly WrittenRule[]; readonly terms: readonly Dated[] };

export type Written = {
  readonly questions: readonly AskedQuestion[];
  readonly layers: readonly WrittenLayer[];
  readonly except: readonly string[];
  readonly on: string;
  readonly places: readonly WrittenPlace[];
};

/** One way a question can truly be: yes or no, an option, a set of options, an amount, an amount a currency, a place. */
type Fact = boolean | string | bigint | ReadonlySet<string> | ReadonlyMap<string, bigint>;

export type Truth = 'yes' | 'no' | 'open';
type Said = Readonly<Record<string, unknown>>;

export type Oracle = {
  /** Ids of active rules, lowest rank first. */
  readonly rules: readonly string[];
  /** What all completions of the answers say of a rule. */
  readonly truthOf: (rule: string, answers: Said) => Truth;
  readonly truthOfTerm: (term: string, answers: Said) => Truth;
  /** The questions in which two completions differ, in nothing else, with different outcomes for the rule. */
  readonly relevant: (rule: string, answers: Said) => readonly string[];
  /** Truth of a question's gate; a question without one is open to all. */
  readonly gateOf: (question: string, answers: Said) => Truth;
  readonly gateRestsOn: (question: string, answers: Said) => readonly string[];
  readonly attackers: (rule: string) => readonly string[];
  /** The other rules that disagree with it while both are effective. */
  readonly rivals: (rule: string) => readonly string[];
  /** Two rules that replace the same target and are both effective in some world, unmarked, neither attacking the other. Lower rank first. */
  readonly clashes: () => readonly { readonly target: string; readonly rules: readonly [string, string] }[];
  /** The fewest questions in which a world with that outcome goes against what was said; null where there is no such world. */
  readonly fewestChanges: (rule: string, answers: Said, wanted: boolean) => number | null;
  /** The worlds in which two rules are not alike: one is effective and the other is not, or only one meets an effective rival. */
  readonly differing: (one: string, other: string) => number;
  readonly worlds: number;
};

const UNITS: Readonly<Record<string, readonly [base: string, millionths: bigint]>> = {
  mm: ['length', 1_000_000n],
  cm: ['length', 10_000_000n],
  mL: ['volume', 1_000_000n],
  L: ['volume', 1_000_000_000n],
  kg: ['mass', 1_000_000n],
  g: ['mass', 1_000n],
};

/** Millionths of the base unit, by hand: digits shifted, half up. */
function scaled(value: unknown, unit: string): bigint | null {
  const parts = /^(-?)(\d+)(?:\.(\d+))?$/.exec(String(value));
  if (parts === null || typeof value === 'boolean') return null;
  const [, sign, whole = '', rest = ''] = parts;
  const perUnit = UNITS[unit]?.[1] ?? 1_000_000n;
  const places = 10n ** BigInt(rest.length);
  const size = (2n * BigInt(whole + rest) * perUnit + places) / (2n * places);
  return sign === '-' ? -size : size;
}

const isObject = (value: unknown): value is Json => typeof value === 'object' && value !== null && !Array.isArray(value);
const isAmounts = (fact: Fact): fact is ReadonlyMap<string, bigint> => fact instanceof Map;
const isList = (value: unknown): value is readonly unknown[] => Array.isArray(value);
const listOf = (value: unknown): readonly unknown[] => (isList(value) ? value : []);
const text = (value: unknown): string => (typeof value === 'string' ? value : '');
const COMPARISONS: Readonly<Record<string, (a: bigint, b: bigint) => boolean>> = {
  lt: (a, b) => a < b,
  le: (a, b) => a <= b,
  gt: (a, b) => a > b,
  ge: (a, b) => a >= b,
};

/** Every object in a condition that asks a question. */
function leavesIn(when: unknown): readonly Json[] {
  if (Array.isArray(when)) return when.flatMap(leavesIn);
  if (!isObject(when)) return [];
  return 'question' in when ? [when] : Object.values(when).flatMap(leavesIn);
}

const holdsOn = (dated: Dated, day: string): boolean => (dated.from === null || dated.from <= day) && (dated.to === null || day < dated.to);

function thresholdsOf(leaves: readonly Json[], question: string): readonly { unit: string; at: bigint }[] {
  return leaves
    .filter((leaf) => leaf['question'] === question)
    .flatMap((leaf) => Object.keys(COMPARISONS).flatMap((by) => (isObject(leaf[by]) ? [leaf[by]] : [])))
    .map((bound) => ({ unit: text(bound['unit']), at: scaled(bound['value'], text(bound['unit'])) ?? 0n }));
}

/** Amounts that tell every threshold apart: each, one millionth more, and one millionth less than the smallest. */
function tellingAmounts(at: readonly bigint[]): readonly bigint[] {
  const sorted = [...new Set(at)].sort((a, b) => (a < b ? -1 : 1));
  return sorted.length === 0 ? [0n] : [(sorted[0] ?? 0n) - 1n, ...sorted.flatMap((amount) => [amount, amount + 1n])];
}

const subsetsOf = (options: readonly string[]): readonly ReadonlySet<string>[] =>
  options.reduce<readonly ReadonlySet<string>[]>((sets, option) => [...sets, ...sets.map((set) => new Set([...set, option]))], [new Set()]);

const lookAlike = (a: bigint, b: bigint, at: readonly bigint[]): boolean => at.every((t) => a < t === b < t && a > t === b > t);

/** Builds the oracle: every world, and for every world every rule. */
export function oracleOf(written: Written): Oracle {
  const { questions, layers, on } = written;
  const leaves = layers.flatMap(({ rules, terms }) => [...rules, ...terms].flatMap(({ when }) => leavesIn(when)));
  const named = new Set(leaves.flatMap((leaf) => ('within' in leaf ? [text(leaf['within'])] : [])));
  const lines = new Map<string, readonly string[]>([...named].map((code) => [code, [code]]));
  for (const { code, line } of written.places) lines.set(code, line);
  const ELSEWHERE = '(elsewhere)';

  const amountsOf = (id: string): readonly bigint[] => thresholdsOf(leaves, id).map(({ at }) => at);
  const currenciesOf = (id: string): readonly string[] => [...new Set(thresholdsOf(leaves, id).map(({ unit }) => unit))];
  const amountsIn = (id: string, currency: string): readonly bigint[] =>
    thresholdsOf(leaves, id).flatMap(({ unit, at }) => (unit === currency ? [at] : []));

  const factsOf = ({ id, kind, options = [] }: AskedQuestion): readonly Fact[] => {
    if (kind === 'yesno') return [false, true];
    if (kind === 'choice') return options;
    if (kind === 'several') return subsetsOf(options);
    if (kind === 'amount') return tellingAmounts(amountsOf(id));
    if (kind === 'region') return [...lines.keys(), ELSEWHERE];
    return currenciesOf(id).reduce<readonly ReadonlyMap<string, bigint>[]>(
      (maps, currency) => maps.flatMap((map) => tellingAmounts(amountsIn(id, currency)).map((at) => new Map([...map, [currency, at]]))),
      [new Map()],
    );
  };
  const facts = questions.map(factsOf);
  /** A world is a number whose digits choose a fact for each question. The last question varies fastest. */
  const strides = facts.map((_, at) => facts.slice(at + 1).reduce((product, own) => product * own.length, 1));
  const worlds = Array.from({ length: facts.reduce((product, own) => product * own.length, 1) }, (_, world) => world);
  const place = new Map(questions.map(({ id }, at) => [id, at]));

  const termFor = (id: string, layer: number): { when: unknown; layer: number } | null => {
    for (const candidate of [layer, ...layers.map((_, at) => layers.length - 1 - at)]) {
      const found = layers[candidate]?.terms.find((term) => term.id === id && holdsOn(term, on));
      if (found !== undefined) return { when: found.when, layer: candidate };
    }
    return null;
  };

  const fits = (leaf: Json, fact: Fact): boolean => {
    if ('within' in leaf) return (lines.get(text(fact)) ?? []).includes(text(leaf['within']));
    const wanted = 'in' in leaf ? listOf(leaf['in']) : [leaf['is']];
    if (typeof fact === 'boolean' || typeof fact === 'string') return wanted.includes(fact);
    if (fact instanceof Set) return wanted.some((option) => fact.has(text(option)));
    return Object.entries(COMPARISONS).some(([by, compare]) => {
      const bound = leaf[by];
      if (!isObject(bound)) return false;
      const amount = isAmounts(fact) ? fact.get(text(bound['unit'])) : fact;
      const limit = scaled(bound['value'], text(bound['unit']));
      return typeof amount === 'bigint' && limit !== null && compare(amount, limit);
    });
  };
  const fitting = new Map<Json, readonly boolean[]>();
  const asked = (leaf: Json, world: number): boolean => {
    const at = place.get(text(leaf['question'])) ?? -1;
    const gate = questions[at]?.askIf;
    if (gate !== undefined && !asked(gate, world)) return false;
    const own = facts[at] ?? [];
    const known = fitting.get(leaf) ?? own.map((fact) => fits(leaf, fact));
    fitting.set(leaf, known);
    return known[Math.floor(world / (strides[at] ?? 1)) % own.length] ?? false;
  };
  const holds = (when: unknown, world: number, layer: number): boolean => {
    if (!isObject(when)) return when === true;
    if ('all' in when) return listOf(when['all']).every((part) => holds(part, world, layer));
    if ('any' in when) return listOf(when['any']).some((part) => holds(part, world, layer));
    if ('not' in when) return !holds(when['not'], world, layer);
    if (!('term' in when)) return asked(when, world);
    const term = termFor(text(when['term']), layer);
    return term !== null && holds(term.when, world, term.layer);
  };

  const active = layers
    .flatMap(({ rules }, layer) => rules.map((rule) => ({ ...rule, layer })))
    .filter((rule) => holdsOn(rule, on) && !written.except.includes(rule.id))
    .sort((a, b) => a.layer - b.layer || a.order - b.order || (a.id < b.id ? -1 : 1));
  const attackersOf = (id: string): readonly string[] => active.filter(({ targets }) => targets.includes(id)).map((rule) => rule.id);
  const effective = new Map<string, readonly boolean[]>();
  for (const rule of active.toReversed()) {
    const against = attackersOf(rule.id).map((id) => effective.get(id));
    effective.set(
      rule.id,
      worlds.map((world) => holds(rule.when, world, rule.layer) && !against.some((attacker) => attacker?.[world] === true)),
    );
  }

  const meant = (code: string): readonly string[] => {
    const bloc = (known: string): boolean => known === 'eu' || (known.length > 2 && !known.includes('-'));
    const members = (known: string): readonly string[] => [...lines].flatMap(([member, line]) => (line.includes(known) ? [member] : []));
    for (const candidate of [code, code.split('-')[0] ?? '']) {
      if (lines.has(candidate)) return bloc(candidate) ? [candidate, ...members(candidate)] : [candidate];
      if (bloc(candidate) && members(candidate).length > 0) return [ELSEWHERE, ...members(candidate)];
    }
    return [ELSEWHERE];
  };
  const signature = (code: string): string => [...named].map((within) => ((lines.get(code) ?? []).includes(within) ? 'x' : '-')).join('');

  /** Whether a fact agrees with an answer; an answer that makes no sense agrees with every fact. */
  const agrees = (question: AskedQuestion, fact: Fact, answer: unknown): boolean => {
    const { id, kind, options = [], unit = '' } = question;
    if (kind === 'yesno') return typeof answer !== 'boolean' || fact === answer;
    if (kind === 'choice') return !options.includes(text(answer)) || fact === answer;
    if (kind === 'several') {
      const list = listOf(answer).length === 1 && listOf(answer)[0] === 'none' ? [] : listOf(answer);
      if (!Array.isArray(answer) || !(fact instanceof Set) || !list.every((option) => options.includes(text(option)))) return true;
      return options.every((option) => fact.has(option) === list.includes(option));
    }
    if (kind === 'amount') {
      const amount = typeof answer === 'number' || typeof answer === 'string' ? scaled(answer, unit) : null;
      return amount === null || (typeof fact === 'bigint' && lookAlike(fact, amount, amountsOf(id)));
    }
    if (kind === 'region') {
      if (typeof answer !== 'string' || !/^[a-z]/.test(answer)) return true;
      return meant(answer).some((code) => signature(code) === signature(text(fact)));
    }
    const given = (Array.isArray(answer) ? listOf(answer) : [answer]).filter(isObject);
    return given.every(({ amount, currency }) => {
      const own = isAmounts(fact) ? fact.get(text(currency)) : undefined;
      const said = scaled(amount, text(currency));
      return typeof own !== 'bigint' || said === null || lookAlike(own, said, amountsIn(id, text(currency)));
    });
  };

  /** The worlds that agree with everything said. */
  const completions = (answers: Said): readonly number[] =>
    questions.reduce<readonly number[]>(
      (starts, question, at) => {
        const live = (facts[at] ?? []).flatMap((fact, choice) =>
          !Object.hasOwn(answers, question.id) || agrees(question, fact, answers[question.id]) ? [choice * (strides[at] ?? 0)] : [],
        );
        return starts.flatMap((start) => live.map((step) => start + step));
      },
      [0],
    );

  const truth = (values: (world: number) => boolean, answers: Said): Truth => {
    const seen = new Set(completions(answers).map(values));
    return seen.size === 2 ? 'open' : seen.has(true) ? 'yes' : 'no';
  };
  const restsOn = (values: (world: number) => boolean, answers: Said): readonly string[] => {
    const possible = completions(answers);
    return questions.flatMap(({ id }, at) => {
      const stride = strides[at] ?? 1;
      const span = stride * (facts[at]?.length ?? 1);
      const seen = new Map<number, boolean>();
      const matters = possible.some((world) => {
        const rest = Math.floor(world / span) * span + (world % stride);
        const before = seen.get(rest);
        seen.set(rest, values(world));
        return before !== undefined && before !== values(world);
      });
      return matters ? [id] : [];
    });
  };
  const valueOf =
    (rule: string) =>
    (world: number): boolean =>
      effective.get(rule)?.[world] ?? false;
  const gateValue =
    (question: string) =>
    (world: number): boolean => {
      const gate = questions.find(({ id }) => id === question)?.askIf;
      return gate === undefined || asked(gate, world);
    };
  const byId = new Map(active.map((rule) => [rule.id, rule]));
  const rivals = (id: string): readonly string[] => {
    const rule = byId.get(id);
    return active.flatMap((other) => {
      if (rule === undefined || other.id === id || rule.kind !== 'replaces' || other.kind !== 'replaces') return [];
      const shared = rule.targets.some((target) => byId.has(target) && other.targets.includes(target));
      return shared && (rule.alongside.includes(other.id) || other.alongside.includes(id)) ? [other.id] : [];
    });
  };

  const clashes: Oracle['clashes'] = () =>
    active.flatMap(({ id: target }) => {
      const replacing = active.filter((rule) => rule.kind === 'replaces' && rule.targets.includes(target));
      return replacing.flatMap((higher, at) =>
        replacing.slice(0, at).flatMap((lower) => {
          const settled = higher.targets.includes(lower.id) || higher.alongside.includes(lower.id) || lower.alongside.includes(higher.id);
          const both = (world: number): boolean => valueOf(lower.id)(world) && valueOf(higher.id)(world);
          return !settled && worlds.some(both) ? [{ target, rules: [lower.id, higher.id] as const }] : [];
        }),
      );
    });

  const fewestChanges = (rule: string, answers: Said, wanted: boolean): number | null => {
    const against = questions.map((question, at) =>
      (facts[at] ?? []).map((fact) => Object.hasOwn(answers, question.id) && !agrees(question, fact, answers[question.id])),
    );
    const counts = worlds
      .filter((world) => valueOf(rule)(world) === wanted)
      .map((world) => against.filter((own, at) => own[Math.floor(world / (strides[at] ?? 1)) % own.length] === true).length);
    return counts.length === 0 ? null : Math.min(...counts);
  };

  const stance = (rule: string, world: number): string => {
    if (!valueOf(rule)(world)) return 'no';
    return rivals(rule).some((rival) => valueOf(rival)(world)) ? 'disputed' : 'yes';
  };

  return {
    rules: active.map(({ id }) => id),
    differing: (one, other) => worlds.filter((world) => stance(one, world) !== stance(other, world)).length,
    truthOf: (rule, answers) => truth(valueOf(rule), answers),
    truthOfTerm: (term, answers) => {
      const found = termFor(term, layers.length - 1);
      return found === null ? 'open' : truth((world) => holds(found.when, world, found.layer), answers);
    },
    relevant: (rule, answers) => restsOn(valueOf(rule), answers),
    gateOf: (question, answers) => truth(gateValue(question), answers),
    gateRestsOn: (question, answers) => restsOn(gateValue(question), answers),
    attackers: attackersOf,
    rivals,
    clashes,
    fewestChanges,
    worlds: worlds.length,
  };
}
