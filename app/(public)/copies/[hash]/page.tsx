import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { ChangeList } from '@/components/checks/changes-panel';
import { ChecklistReport } from '@/components/checks/checklist-report';
import { PieceFigure } from '@/components/checks/piece-figure';
import { ReportBanner } from '@/components/checks/report-banner';
import { ReviewList } from '@/components/checks/review-list';
import { Disclosure } from '@/components/ui/disclosure';
import { PageHeading } from '@/components/ui/page-heading';
import { PrintFoot } from '@/components/ui/print-foot';
import { reviewOf } from '@/lib/checks/domain/review';
import { readCopy, type ReadCopy } from '@/lib/checks/read-copy';
import { copyHash } from '@/lib/checks/schema';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';

type Props = {
  readonly params: Promise<{ readonly hash: string }>;
  readonly searchParams: Promise<{ readonly place?: string | string[] }>;
};

export const metadata: Metadata = { title: words('checks.copy.title'), robots: { index: false } };

export default async function CopyPage({ params, searchParams }: Props): Promise<ReactElement> {
  const hash = copyHash.safeParse((await params).hash);
  const asked = (await searchParams).place;
  const place = typeof asked === 'string' ? asked : null;
  const read = hash.success ? await readCopy(makeCtx(), hash.data, place) : null;
  if (read?.ok !== true) notFound();
  const { copy, checklist, names, lines, openQuestions, explanation, today, madeOn } = read.value;
  const places = sayList(copy.regions.map(({ code }) => names.get(code) ?? code));
  return (
    <>
      <PrintFoot said={`${words('site.name')} – ${places} – ${sayDate(copy.on)} – ${words('checks.result.notProof')}`} />
      <div className="columns">
        <div className="main-part">
          <PageHeading>{`${words('checks.copy.title')}: ${places}`}</PageHeading>
          <p className="mt-4">{words('checks.copy.lead', { date: sayDate(copy.on) })}</p>
          <ReportBanner regions={checklist.regions} on={copy.on} placeNames={names}>
            <p className="mt-2 font-sans text-small text-umber">
              {words('checks.copy.made', { date: sayDate(madeOn) })}. {words('checks.copy.fingerprint')}:{' '}
              <code className="break-all">{checklist.copy}</code>
            </p>
          </ReportBanner>
          <Disclosure summary={words('checks.copy.answers')}>
            <ReviewList review={reviewOf(lines, copy.answers, copy.declined)} base={null} names={names} />
          </Disclosure>
        </div>
        <div className="side-part mt-8 lg:mt-0">
          <PieceFigure answers={copy.answers} />
        </div>
      </div>
      <ChecklistReport
        regions={checklist.regions}
        lines={lines}
        openQuestions={openQuestions}
        explanation={explanation}
        declined={copy.declined}
        placeNames={names}
        today={today}
        here={`/copies/${checklist.copy}`}
        base={null}
        place={place}
      />
      <Since read={read.value} />
    </>
  );
}

function Since({ read: { changes, today } }: { readonly read: ReadCopy }): ReactElement {
  const date = sayDate(today);
  return (
    <section className="mt-8" aria-labelledby="since">
      <h2 id="since">{words('checks.copy.since')}</h2>
      {changes === null ? (
        <p>{words('checks.copy.sinceGone')}</p>
      ) : (
        <>
          <p>{changes.length === 0 ? words('checks.copy.sinceNone', { date }) : words('checks.copy.sinceSome', { date })}</p>
          <ChangeList changes={changes} />
        </>
      )}
    </section>
  );
}
