/** One place to change: the text as it stands, found exactly once, and what stands there instead. */
export type Edit = { readonly file: string; readonly from: string; readonly to: string };

/** A mistake of the kind people make, and the test that must not let it pass. */
export type PlantedBug = { readonly name: string; readonly edits: readonly Edit[]; readonly suite: string; readonly test: string };

type Where = readonly [suite: 'properties' | 'unit', file: string, test: string];

const ENGINE = 'lib/checks/domain';
const bug = (name: string, [suite, file, test]: Where, ...edits: readonly Edit[]): PlantedBug => ({
  name,
  edits,
  suite: suite === 'unit' ? `tests/unit/checks/${file}.test.ts` : `tests/properties/${file}.test.ts`,
  test,
});
const edit = (file: string, from: string, to: string): Edit => ({ file: file.includes('/') ? file : `${ENGINE}/${file}`, from, to });

const RULE = 'lib/regions/domain/rule.ts';

const LOGIC: readonly PlantedBug[] = [
  bug('negation lost on the tape', ['properties', 'check-others', 'CHECK-22'], edit('compile-condition.ts', 'shop.tape.not();', '')),
  bug(
    'negation lost in the diagram',
    ['properties', 'check-status', 'CHECK-2'],
    edit('compile-condition.ts', 'node: shop.builder.not(part.node)', 'node: part.node'),
  ),
  bug(
    'not known read as no',
    ['properties', 'check-status', 'CHECK-1'],
    edit('tape.ts', '(possible & wanted) === 0 ? NO : UNKNOWN', '(possible & wanted) === 0 ? NO : NO'),
  ),
  bug(
    'a missing answer read as no',
    ['properties', 'check-status', 'CHECK-2'],
    edit(
      'knowledge.ts',
      '!Object.hasOwn(answers, id)) continue;',
      '!Object.hasOwn(answers, id)) { if (cut?.kind === "yesno") masks[cut.first] = 1; continue; }',
    ),
  ),
  bug(
    'several: any of these read as all of these',
    ['properties', 'check-others', 'CHECK-22'],
    edit('compile-condition.ts', "shop.tape.join('any', literals.length)", "shop.tape.join('all', literals.length)"),
  ),
  bug(
    'gate dropped',
    ['properties', 'check-status', 'CHECK-2'],
    edit('compile-condition.ts', 'if (gate === undefined) return', 'if (gate !== null) return'),
  ),
];

const LAYERS: readonly PlantedBug[] = [
  bug(
    'exception ignored',
    ['properties', 'check-status', 'CHECK-2'],
    edit('line-build.ts', 'const attackers = rule.attackers.flatMap(', 'const attackers = rule.attackers.slice(0, 0).flatMap('),
  ),
  bug(
    'exception that applies but is itself silenced still silences',
    ['properties', 'check-exceptions', 'CHECK-9'],
    edit(
      'line-build.ts',
      'nodes.push(shop.builder.not(attacker.node));',
      'nodes.push(shop.builder.not((attacker as BuiltRule).when.node));',
    ),
  ),
  bug(
    'last layer dropped',
    ['properties', 'check-status', 'CHECK-2'],
    edit('attacks.ts', 'return layers.flatMap(', 'return layers.slice(0, 2).flatMap('),
  ),
  bug('begins a day late', ['properties', 'check-status', 'CHECK-2'], edit(RULE, 'span.from <= on', 'span.from < on')),
  bug('ends a day late', ['properties', 'check-status', 'CHECK-2'], edit(RULE, 'on < span.to', 'on <= span.to')),
  bug(
    'excepted rules still count',
    ['properties', 'check-status', 'CHECK-2'],
    edit('attacks.ts', '&& !excepted.has(rule.id)', '&& (excepted.size >= 0 || rule.firm)'),
  ),
  bug(
    'firm ignored',
    ['unit', 'faults', 'CHECK-17'],
    edit('attacks.ts', 'target?.rule.firm === true &&', 'target?.rule.firm === undefined &&'),
  ),
  bug('attack upwards let through', ['unit', 'faults', 'CHECK-17'], edit('attacks.ts', 'attacker > rank)', 'attacker >= 0)')),
  bug(
    'term read from the most local layer',
    ['properties', 'check-status', 'CHECK-2'],
    edit('terms.ts', '[layer, ...localFirst].find', '[...localFirst].find'),
  ),
  bug(
    'sources marked as disagreeing shown as agreeing',
    ['properties', 'check-status', 'CHECK-15'],
    edit('attacks.ts', 'one.rule.alongside.includes(other.rule.id)', 'one.rule.alongside.includes(one.rule.id)'),
  ),
];

const AMOUNTS: readonly PlantedBug[] = [
  bug('at most read as less than', ['properties', 'check-cut-points', 'CHECK-14'], edit('cells.ts', 'return upTo;', 'return below;')),
  bug(
    'threshold shifted by a millionth',
    ['properties', 'check-cut-points', 'CHECK-14'],
    edit('cells.ts', 'cuts[below] === amount ? 1 : 0', '(cuts[below] ?? 0n) - amount <= 1n ? 1 : 0'),
  ),
  bug(
    'litres read as millilitres',
    ['properties', 'check-cut-points', 'CHECK-14'],
    edit('lib/kernel/quantity.ts', "L: ['mL', 9]", "L: ['mL', 6]"),
  ),
  bug(
    'currency ignored',
    ['properties', 'check-status', 'CHECK-2'],
    edit('cells.ts', "test.kind === 'compares' && test.currency === currency", "test.kind === 'compares' && test.currency !== undefined"),
    edit('cells.ts', 'cut.currencies.indexOf(currency)', '0'),
  ),
  bug(
    'a part of a country lies nowhere',
    ['properties', 'check-status', 'CHECK-2'],
    edit('region-cells.ts', "cells.placed.get(code.split('-')[0] ?? code) ?? ", ''),
  ),
];

const ASKING: readonly PlantedBug[] = [
  bug(
    'relevance without what is known',
    ['properties', 'check-questions', 'CHECK-4'],
    edit('next-question.ts', 'knowledgeOf(line, answers).masks', 'line.variables.all'),
  ),
  bug(
    'declined questions asked again',
    ['properties', 'check-questions', 'CHECK-7'],
    edit('next-question.ts', "!declined.includes(line.questions[question] ?? '')", "line.questions[question] !== ''"),
  ),
  bug(
    'a question asked before its gate',
    ['properties', 'check-questions', 'CHECK-5'],
    edit('next-question.ts', 'return gate === undefined ||', 'return gate !== null ||'),
  ),
  bug(
    'a test that no longer decides kept in the diagram',
    ['properties', 'check-questions', 'CHECK-4'],
    edit('diagram.ts', 'if (this.isRedundant(base, count)) return', 'if (count === 1 && this.isRedundant(base, count)) return'),
  ),
  bug(
    'reason with spare answers',
    ['properties', 'check-reason', 'CHECK-11'],
    edit('reason.ts', '!== UNKNOWN) continue;', '=== null) continue;'),
  ),
  bug('status remembered from other answers', ['properties', 'check-reason', 'CHECK-11'], edit('reason.ts', 'exact.forget();', '')),
];

export const PLANTED_BUGS: readonly PlantedBug[] = [...LOGIC, ...LAYERS, ...AMOUNTS, ...ASKING];
