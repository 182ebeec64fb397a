import type { JudgedRule } from './checklist';

/** What a list can say of limits: some may bind, only figures from memory or of nobody's law may, or we have found none at all. */
export type LimitsOfList = 'some' | 'unconfirmed' | 'not-found';

/**
 * Whether silence on limits could be taken for their absence. A place whose limits we know and that do not apply to this piece
 * has some; one that we know nothing of must say so before its list is read.
 */
export function limitsOfList(rules: readonly Pick<JudgedRule, 'topic' | 'strength'>[]): LimitsOfList {
  const limits = rules.filter(({ topic }) => topic === 'limit');
  if (limits.some(({ strength }) => strength !== 'note')) return 'some';
  return limits.length > 0 ? 'unconfirmed' : 'not-found';
}
