import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { ReadingsForm } from '@/components/readings/readings-form';
import { ReadingsResult } from '@/components/readings/readings-result';
import { LinkButton } from '@/components/ui/link-button';
import { PageHeading } from '@/components/ui/page-heading';
import { PrintFoot } from '@/components/ui/print-foot';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { shownFaults } from '@/lib/readings/domain/sheet-faults';
import { firstOf } from '@/lib/readings/domain/typed-rows';
import { judgeReadings, type JudgedReadings } from '@/lib/readings/judge-readings';
import { readEntry, type ReadSheet } from '@/lib/readings/read-entry';
import { sheetId } from '@/lib/readings/sheet-schema';
import { listRegions, type ListedRegion } from '@/lib/regions/list-regions';
import { makeCtx, type Ctx } from '@/lib/server/ctx';
import { newAddress } from '@/lib/server/new-address';
import { keepReadings } from '../actions';

type Props = { readonly params: Promise<{ readonly sheetId: string }> };

export const metadata: Metadata = {
  title: `${words('readings-page.entryTitle')} – ${words('readings-page.title')}`,
  robots: { index: false },
};

export default async function ReadingsOfPage({ params }: Props): Promise<ReactElement> {
  const id = sheetId.safeParse((await params).sheetId);
  const ctx = makeCtx();
  const read = id.success ? await readEntry(ctx, id.data) : null;
  if (read?.ok !== true) notFound();
  const sheet = read.value;
  const [places, outcome] = await Promise.all([listRegions(ctx), outcomeOf(ctx, sheet)]);
  const placeNames = new Map(places.map(({ code, name }) => [code, name]));
  if (outcome.judged === null) return <Entry sheet={{ ...sheet, faults: outcome.faults }} places={places} />;
  const { regions, on } = outcome.judged;
  const named = sayList(regions.map(({ code }) => placeNames.get(code) ?? code));
  return (
    <>
      <PrintFoot said={`${words('site.name')} – ${words('readings-page.result.printFoot', { places: named, date: sayDate(on) })}`} />
      <PageHeading takesFocus>{words('readings-page.resultTitle', { places: named })}</PageHeading>
      <ReadingsResult regions={regions} on={on} entry={sheet.entry} placeNames={placeNames} />
      <div className="not-in-print mt-8 flex flex-col items-start gap-4">
        <p className="font-sans text-small text-umber">{words('readings-page.result.print')}</p>
        <Kept sheet={sheet} />
        <LinkButton kind="plain" href="/readings">
          {words('readings-page.act.back')}
        </LinkButton>
      </div>
      <section className="not-in-print mt-8" aria-labelledby="mend">
        <h2 id="mend" className="mb-6">
          {words('readings-page.result.mend')}
        </h2>
        <Form sheet={sheet} places={places} submit={words('readings-page.act.again')} />
      </section>
    </>
  );
}

type Outcome = { readonly judged: JudgedReadings | null; readonly faults: ReadSheet['faults'] };

/** Held against the limits when that was asked for and everything can be read; else what is to be mended first. */
async function outcomeOf(ctx: Ctx, { fields, input, faults }: ReadSheet): Promise<Outcome> {
  const act = firstOf(fields, 'act');
  if (act !== '' || input === null) return { judged: null, faults: shownFaults(faults, act) };
  const judged = await judgeReadings(ctx, input);
  if (judged.ok) return { judged: judged.value, faults: [] };
  return { judged: null, faults: [{ field: 'region', place: 'places', why: 'unknown-place', name: judged.error.code }] };
}

type EntryProps = { readonly sheet: ReadSheet; readonly places: readonly ListedRegion[] };

function Entry({ sheet, places }: EntryProps): ReactElement {
  return (
    <>
      <PageHeading>{words('readings-page.entryTitle')}</PageHeading>
      {sheet.faults.length > 0 ? null : <p className="mt-4 max-w-text">{words('readings-page.before')}</p>}
      <Kept sheet={sheet} />
      <div className="mt-8">
        <Form sheet={sheet} places={places} submit={words('readings-page.act.judge')} />
      </div>
    </>
  );
}

/** An address of its own for each entry: what was sent before stays as it was, and Back leads to it. */
function Form({ sheet, places, submit }: EntryProps & { readonly submit: string }): ReactElement {
  return <ReadingsForm address={newAddress()} view={sheet} places={places} submit={submit} act={keepReadings} />;
}

function Kept({ sheet }: Pick<EntryProps, 'sheet'>): ReactElement {
  return (
    <p className="mt-2 max-w-text font-sans text-small text-umber">
      {words('readings-page.kept', { date: sayDate(calendarDateOf(sheet.keptUntil)) })}
    </p>
  );
}
