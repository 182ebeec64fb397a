import type { ReactElement, ReactNode } from 'react';
import { Badge } from '@/components/ui/badge';
import { DefinitionList } from '@/components/ui/definition-list';
import type { Review, ReviewRow } from '@/lib/checks/domain/review';
import { words } from '@/lib/kernel/words';
import { answerWords, questionWords } from './question-words';

type Props = { readonly review: Review; readonly base: string | null; readonly names: ReadonlyMap<string, string> };

/** All that was said of a piece: what is not known first, the rest by topic; each with a way back unless `base` is null. */
export function ReviewList({ review, base, names }: Props): ReactElement {
  const rows = (list: readonly ReviewRow[]) => (
    <DefinitionList
      entries={list.map((row) => ({
        id: row.question.id,
        name: questionWords(row.question.id, 'short'),
        value: valueOf(row, names),
        act: base === null ? undefined : <Mend base={base} id={row.question.id} />,
      }))}
    />
  );
  return (
    <>
      {review.notKnown.length === 0 ? null : (
        <section aria-labelledby="not-known">
          <h2 id="not-known">{words('checks.review.notKnown')}</h2>
          <p>{words('checks.review.notKnownText')}</p>
          {rows(review.notKnown)}
        </section>
      )}
      {review.topics.map(({ topic, rows: own }) => (
        <section key={topic} className="mt-6" aria-labelledby={`topic-${topic}`}>
          <h2 id={`topic-${topic}`}>{words(`checks.topics.${topic}`)}</h2>
          {rows(own)}
        </section>
      ))}
    </>
  );
}

function valueOf(row: ReviewRow, names: Props['names']): ReactNode {
  if (row.kind === 'not-known') return words('checks.question.unknown');
  const said = <bdi>{answerWords(row.question, row.value, names)}</bdi>;
  if (!row.setAside) return said;
  return (
    <>
      {said} <Badge>{words('checks.review.setAside')}</Badge>
    </>
  );
}

function Mend({ base, id }: { readonly base: string; readonly id: string }): ReactElement {
  return (
    <a href={`${base}/${id}`} aria-label={words('checks.review.mendOf', { question: questionWords(id, 'short') })}>
      {words('checks.review.mend')}
    </a>
  );
}
