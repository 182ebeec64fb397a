import type { JudgedRule, LoadedLine } from '@/lib/checks/domain/checklist';
import { questionsOpenFor } from '@/lib/checks/domain/next-question';
import type { Answers } from '@/lib/checks/domain/knowledge';
import type { Rule } from '@/lib/regions/domain/rule';
import { methodFor, type Method } from './conditions';
import type { LimitOf } from './specimen';

/** A limit that applies to the piece, or that may once the questions in `assuming` are answered. */
export type PossibleLimit = {
  readonly rule: JudgedRule;
  readonly limit: LimitOf;
  readonly method: Method;
  readonly assuming: readonly string[];
};

/**
 * The limits of a line that are possible for a piece, in rank order: all but those whose exact status is that they do not
 * apply. One that a replacement silences is not possible.
 */
export function possibleLimits(
  { layers, line, compiled }: LoadedLine,
  judged: readonly JudgedRule[],
  answers: Answers,
): readonly PossibleLimit[] {
  const written = new Map(layers.flatMap(({ sheet }) => sheet.rules.map((rule) => [rule.id, rule])));
  const open = judged.filter(({ status }) => status !== 'does-not-apply');
  const methods = open.flatMap(({ id, topic }): Rule | readonly Rule[] => (topic === 'method' ? (written.get(id) ?? []) : []));
  return open.flatMap((rule): readonly PossibleLimit[] => {
    const source = written.get(rule.id);
    if (source?.payload.topic !== 'limit') return [];
    const method = methodFor(source, methods, line.layers);
    return [{ rule, limit: source.payload, method, assuming: questionsOpenFor(compiled, answers, [], rule.id) }];
  });
}
