import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { ChangesPanel } from '@/components/checks/changes-panel';
import { CheapestFact } from '@/components/checks/cheapest-fact';
import { ChecklistReport } from '@/components/checks/checklist-report';
import { PieceFigure } from '@/components/checks/piece-figure';
import { ReportBanner } from '@/components/checks/report-banner';
import { LinkButton } from '@/components/ui/link-button';
import { PageHeading } from '@/components/ui/page-heading';
import { PrintFoot } from '@/components/ui/print-foot';
import { SubmitButton } from '@/components/ui/submit-button';
import { readResult, type ReadResult } from '@/lib/checks/read-result';
import { checkId } from '@/lib/checks/schema';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';
import { keepCopy } from '../actions';

type Props = {
  readonly params: Promise<{ readonly checkId: string }>;
  readonly searchParams: Promise<{ readonly place?: string | string[] }>;
};

export const metadata: Metadata = { title: `${words('checks.result.title')} – ${words('checks.title')}`, robots: { index: false } };

export default async function ResultPage({ params, searchParams }: Props): Promise<ReactElement> {
  const id = checkId.safeParse((await params).checkId);
  const asked = (await searchParams).place;
  const place = typeof asked === 'string' ? asked : null;
  const ctx = makeCtx();
  const read = id.success ? await readResult(ctx, id.data, place) : null;
  if (read?.ok !== true) notFound();
  const { open, checklist, changes, openQuestions, explanation } = read.value;
  const { check, names, lines, on } = open;
  const here = `/check/${check.id}`;
  const shown = check.regions.find((code) => code === place);
  const places = sayList((shown === undefined ? check.regions : [shown]).map((code) => names.get(code) ?? code));
  return (
    <>
      <PrintFoot said={`${words('site.name')} – ${places} – ${sayDate(on)} – ${words('checks.result.notProof')}`} />
      <div className="columns">
        <div className="main-part">
          <PageHeading takesFocus>{words('checks.result.titleOf', { places })}</PageHeading>
          <ReportBanner
            regions={checklist.regions.filter(({ code }) => shown === undefined || code === shown)}
            on={on}
            placeNames={names}
          />
          <ChangesPanel changes={changes} />
          <CheapestFact facts={explanation.facts} regions={checklist.regions} base={here} />
        </div>
        <div className="side-part mt-8 lg:mt-0">
          <PieceFigure answers={check.answers} />
          <Acts read={read.value} here={here} />
        </div>
      </div>
      <ChecklistReport
        regions={checklist.regions}
        lines={lines}
        openQuestions={openQuestions}
        explanation={explanation}
        declined={check.declined}
        placeNames={names}
        today={calendarDateOf(ctx.now)}
        here={here}
        base={here}
        place={shown ?? null}
      />
    </>
  );
}

function Acts({ read: { open, checklist }, here }: { readonly read: ReadResult; readonly here: string }): ReactElement {
  return (
    <div className="not-in-print mt-6 flex flex-col items-start gap-4">
      {checklist.next === null ? null : <LinkButton href={`${here}/${checklist.next.question}`}>{words('checks.review.goOn')}</LinkButton>}
      <LinkButton kind="plain" href={`${here}/review`}>
        {words('checks.result.mend')}
      </LinkButton>
      <form action={keepCopy}>
        <input type="hidden" name="id" value={open.check.id} />
        <SubmitButton kind="plain" busy={words('checks.result.keepBusy')}>
          {words('checks.result.keep')}
        </SubmitButton>
        <p className="mt-2 font-sans text-small text-umber">{words('checks.result.keepText')}</p>
      </form>
      <p className="font-sans text-small text-umber">{words('checks.result.print')}</p>
      <p className="font-sans text-small text-umber">{words('checks.kept', { date: sayDate(calendarDateOf(open.keptUntil)) })}</p>
    </div>
  );
}
