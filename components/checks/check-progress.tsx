import type { ReactElement } from 'react';
import { ProgressRings } from '@/components/ui/progress-rings';
import type { TopicProgress } from '@/lib/checks/domain/review';
import { words } from '@/lib/kernel/words';

type Props = { readonly progress: readonly TopicProgress[]; readonly left: number };

/** How far the check is: a ring a topic, and at most how many questions are left. Never a share of a total nobody knows. */
export function CheckProgress({ progress, left }: Props): ReactElement {
  const states = { done: words('site.progress.done'), now: words('site.progress.now'), later: words('site.progress.later') };
  return (
    <div className="mb-6 not-in-print">
      <ProgressRings
        label={words('site.progress.label')}
        topics={progress.map(({ topic, state }) => ({ id: topic, name: words(`checks.topics.${topic}`), state }))}
        words={states}
      />
      <p className="mt-2 font-sans text-small text-umber">
        {words('checks.question.left', { count: left })}. {words('checks.question.leftHint')}
      </p>
    </div>
  );
}
