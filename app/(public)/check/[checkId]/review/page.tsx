import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { PieceFigure } from '@/components/checks/piece-figure';
import { questionWords } from '@/components/checks/question-words';
import { ReviewList } from '@/components/checks/review-list';
import { DefinitionList } from '@/components/ui/definition-list';
import { LinkButton } from '@/components/ui/link-button';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { SubmitButton } from '@/components/ui/submit-button';
import { reviewOf } from '@/lib/checks/domain/review';
import { readCheck, type OpenCheck } from '@/lib/checks/read-check';
import { checkId } from '@/lib/checks/schema';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';
import { show } from '../../actions';

type Props = { readonly params: Promise<{ readonly checkId: string }> };

export const metadata: Metadata = {
  title: `${words('checks.review.title')} – ${words('checks.title')}`,
  robots: { index: false },
};

export default async function ReviewPage({ params }: Props): Promise<ReactElement> {
  const id = checkId.safeParse((await params).checkId);
  const read = id.success ? await readCheck(makeCtx(), id.data) : null;
  if (read?.ok !== true) notFound();
  const open = read.value;
  const { check, lines, names } = open;
  const base = `/check/${check.id}`;
  const review = reviewOf(lines, check.answers, check.declined);
  const nothing = review.topics.length === 0 && review.notKnown.length === 0;
  return (
    <div className="columns">
      <div className="main-part max-w-text">
        <PageHeading takesFocus>{words('checks.review.title')}</PageHeading>
        <p className="mt-4">{words('checks.review.lead')}</p>
        <Open open={open} base={base} />
        <PlacesSaid open={open} base={base} />
        {nothing ? <p className="mt-4">{words('checks.review.nothing')}</p> : null}
        <div className="mt-6">
          <ReviewList review={review} base={base} names={names} />
        </div>
        <form action={show} className="mt-8">
          <input type="hidden" name="id" value={check.id} />
          <SubmitButton busy={words('checks.review.busy')}>{words('checks.review.show')}</SubmitButton>
        </form>
        <p className="mt-4 font-sans text-small text-umber">{words('checks.kept', { date: sayDate(calendarDateOf(open.keptUntil)) })}</p>
      </div>
      <div className="side-part mt-8 lg:mt-0">
        <PieceFigure answers={check.answers} />
      </div>
    </div>
  );
}

function Open({ open, base }: { readonly open: OpenCheck; readonly base: string }): ReactElement | null {
  if (open.next === null) return null;
  return (
    <div className="mt-6">
      <Panel colour="ash">
        <p className="font-strong">{words('checks.review.open', { count: open.stillMatters.length })}</p>
        <p>{words('checks.review.openText')}</p>
        <p className="mt-2">
          <LinkButton kind="plain" href={`${base}/${open.next.question}`}>
            {words('checks.review.goOn')}
          </LinkButton>
        </p>
        <p className="mt-2 font-sans text-small">{questionWords(open.next.question, 'title')}</p>
      </Panel>
    </div>
  );
}

function PlacesSaid({ open, base }: { readonly open: OpenCheck; readonly base: string }): ReactElement {
  const { check, names, on } = open;
  const day = check.saleOn === null ? words('checks.review.today', { date: sayDate(on) }) : sayDate(on);
  const places = words('checks.review.places');
  const mend = (
    <a href={`${base}/places`} aria-label={words('checks.review.mendOf', { question: places })}>
      {words('checks.review.mend')}
    </a>
  );
  return (
    <div className="mt-6">
      <DefinitionList
        entries={[
          { id: 'places', name: places, value: sayList(check.regions.map((code) => names.get(code) ?? code)), act: mend },
          { id: 'day', name: words('checks.review.day'), value: day },
        ]}
      />
    </div>
  );
}
