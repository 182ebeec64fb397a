import { err, ok, type Result } from '@/lib/kernel/result';
import type { Condition } from '@/lib/regions/domain/condition';
import type { OwnedTest } from './cells';
import { readTest, type Scope, type Test } from './condition-reading';
import type { CompileFault } from './line-input';

/** The gate of a question, as a test of another one, and how it is written. `owner` is the gated question's id. */
export type Gate = { readonly question: number; readonly test: Test; readonly leaf: Condition; readonly owner: string };

/** The gates that the tests stand behind, each after the gate of its own question; gates no test needs are left unread. */
export function readGates(tests: readonly OwnedTest[], scope: Pick<Scope, 'questions' | 'placeOf'>): Result<readonly Gate[], CompileFault> {
  const gates = new Map<number, Gate>();
  for (const { test } of tests) {
    const chain = chainFrom(test.question, scope);
    if (!chain.ok) return chain;
    for (const gate of chain.value) gates.set(gate.question, gates.get(gate.question) ?? gate);
  }
  return ok([...gates.values()]);
}

/** The gates above a question, outermost first. A chain longer than the list of questions runs in a circle. */
function chainFrom(question: number, scope: Pick<Scope, 'questions' | 'placeOf'>): Result<readonly Gate[], CompileFault> {
  const chain: Gate[] = [];
  let at = question;
  for (let gated = scope.questions[at]; gated?.askIf !== undefined; gated = scope.questions[at]) {
    if (chain.length === scope.questions.length) return err({ kind: 'bad-test', in: gated.id, about: gated.askIf.question });
    const test = readTest(gated.askIf, scope);
    if (!test.ok) return err({ ...test.error, in: gated.id });
    chain.unshift({ question: at, test: test.value, leaf: gated.askIf, owner: gated.id });
    at = test.value.question;
  }
  return ok(chain);
}
