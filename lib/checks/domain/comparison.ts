import { TOPIC_ORDER } from '@/lib/regions/domain/sheet-reading';
import type { JudgedRule, RegionChecklist } from './checklist';

/** One duty side by side: for each place the lines about it, in the order of the places. */
export type ComparisonRow = {
  readonly id: string;
  readonly topic: JudgedRule['topic'];
  /** For limits: what of, and where. */
  readonly limit: { readonly substance: string; readonly part: string } | null;
  readonly cells: readonly (readonly JudgedRule[])[];
};

/** What is compared: duties and advice of law and authorities that may apply. The base layer is the same everywhere. */
const isCompared = (rule: JudgedRule): boolean => rule.region !== 'care' && rule.strength !== 'note' && rule.status !== 'does-not-apply';

/** Puts the checklists of several places side by side: limits by substance and part, all else by topic. */
export function compare(regions: readonly RegionChecklist[]): readonly ComparisonRow[] {
  const rules = regions.map((region) => region.rules.filter(isCompared));
  const keys = [...new Set(rules.flat().map(keyOf))];
  return TOPIC_ORDER.flatMap((topic) =>
    keys
      .filter((key) => key.split('/')[0] === topic)
      .sort()
      .map((key): ComparisonRow => {
        const [, substance = '', part = ''] = key.split('/');
        const cells = rules.map((own) => own.filter((rule) => keyOf(rule) === key));
        return { id: key.replaceAll('/', '-'), topic, limit: substance === '' ? null : { substance, part }, cells };
      }),
  );
}

const keyOf = ({ topic, payload }: JudgedRule): string => ('decision' in payload ? `${topic}/${payload.substance}/${payload.part}` : topic);
