import { TOPIC_ORDER } from '@/lib/regions/domain/sheet-reading';
import type { JudgedRule } from './checklist';

/** Parts of a checklist in the order they are read. */
export const SECTIONS = [
  'sources-disagree',
  'applies',
  'treat-as-applying',
  'not-settled',
  'notes',
  'open-notes',
  'said',
  'does-not-apply',
] as const;
export type SectionName = (typeof SECTIONS)[number];

/** Common practice stands apart whatever its status; notes stand behind duties and advice. */
function sectionOf({ standing, strength, status }: JudgedRule): SectionName {
  if (standing === 'common-practice') return 'said';
  if (status === 'does-not-apply' || status === 'sources-disagree') return status;
  if (strength !== 'note') return status;
  return status === 'applies' ? 'notes' : 'open-notes';
}

const STRENGTHS: readonly JudgedRule['strength'][] = ['must', 'should', 'may', 'note'];

/** The lines of a checklist by part; within a part must before should before may, each in rank order. */
export function sectionsOf(rules: readonly JudgedRule[]): Readonly<Record<SectionName, readonly JudgedRule[]>> {
  const part = (name: SectionName): readonly JudgedRule[] => {
    const own = rules.filter((rule) => sectionOf(rule) === name);
    return STRENGTHS.flatMap((strength) => own.filter((rule) => rule.strength === strength));
  };
  return {
    'sources-disagree': part('sources-disagree'),
    applies: part('applies'),
    'treat-as-applying': part('treat-as-applying'),
    'not-settled': part('not-settled'),
    notes: part('notes'),
    'open-notes': part('open-notes'),
    said: part('said'),
    'does-not-apply': part('does-not-apply'),
  };
}

/** The lines of a part by topic; topics without a line are left out. */
export function byTopic(
  rules: readonly JudgedRule[],
): readonly { readonly topic: JudgedRule['topic']; readonly rules: readonly JudgedRule[] }[] {
  return TOPIC_ORDER.map((topic) => ({ topic, rules: rules.filter((rule) => rule.topic === topic) })).filter(
    (group) => group.rules.length > 0,
  );
}
