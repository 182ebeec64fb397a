import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { CheckProgress } from '@/components/checks/check-progress';
import { PieceFigure } from '@/components/checks/piece-figure';
import { headingOf, QuestionForm } from '@/components/checks/question-form';
import { findQuestion, pageOf } from '@/lib/checks/domain/steps';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { readQuestionPage, type ReadQuestionPage } from '@/lib/checks/read-question-page';
import { checkId } from '@/lib/checks/schema';
import { makeCtx } from '@/lib/server/ctx';
import { answer } from '../../actions';

type Props = {
  readonly params: Promise<{ readonly checkId: string; readonly question: string }>;
  readonly searchParams: Promise<{ readonly look?: string | string[] }>;
};

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const question = findQuestion((await params).question);
  const name = question === null ? words('checks.title') : headingOf(pageOf(question.id).slice(0, 1));
  return { title: `${name} – ${words('checks.title')}`, robots: { index: false }, referrer: 'same-origin' };
}

export default async function QuestionPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { checkId: address, question: asked } = await params;
  const id = checkId.safeParse(address);
  const question = findQuestion(asked);
  if (!id.success || question === null) notFound();
  const look = (await searchParams).look === '1';
  const read = await readQuestionPage(makeCtx(), { id: id.data, question, look });
  if (!read.ok) notFound();
  const page = read.value;
  const { open } = page;
  const base = `/check/${id.data}`;
  const named = page.matters.map((code) => open.names.get(code) ?? code);
  return (
    <>
      <CheckProgress progress={page.progress} left={open.stillMatters.length} />
      <div className="columns">
        <div className="main-part max-w-text">
          <QuestionForm
            answer={answer}
            page={{
              ...page,
              checkId: id.data,
              asked: question.id,
              places: placesOf(page),
              back: page.before === null ? `${base}/places` : `${base}/${page.before}`,
              regionsNamed: sayList(named),
            }}
          />
          <p className="mt-8">
            <a href={`${base}/review`}>{words('checks.question.review')}</a>
          </p>
          <p className="mt-2 font-sans text-small text-umber">{words('checks.kept', { date: sayDate(calendarDateOf(open.keptUntil)) })}</p>
        </div>
        <div className="side-part mt-8 lg:mt-0">
          <PieceFigure answers={open.check.answers} />
        </div>
      </div>
    </>
  );
}

/** Countries and parts a maker can be in; blocs and standards are nobody's workshop. */
const placesOf = ({ open }: ReadQuestionPage) =>
  [...open.names]
    .filter(([code]) => /^[a-z]{2}(-[a-z0-9]{1,3})?$/.test(code) && code !== 'eu')
    .map(([value, label]) => ({ value, label }))
    .sort((a, b) => a.label.localeCompare(b.label, 'en-GB'));
