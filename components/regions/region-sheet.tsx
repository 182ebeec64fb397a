import type { ReactElement, ReactNode } from 'react';
import { FootRingMark } from '@/components/site/foot-ring-mark';
import { Disclosure } from '@/components/ui/disclosure';
import { ErrorSummary } from '@/components/ui/error-summary';
import { LinkButton } from '@/components/ui/link-button';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { PrintFoot } from '@/components/ui/print-foot';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate, sayPhrases } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { citeSources } from '@/lib/regions/domain/cited-sources';
import { namesOf } from '@/lib/regions/domain/sheet-names';
import { alsoSaid, lookAgain, ringsOf } from '@/lib/regions/domain/sheet-reading';
import type { RegionSheet } from '@/lib/regions/domain/told-sheet';
import type { ToldSource } from '@/lib/regions/domain/told-rule';
import { SheetBanner } from './sheet-banner';
import { SheetDateForm } from './sheet-date-form';
import { sheetParts, type SheetPart } from './sheet-parts';

type Props = {
  readonly sheet: RegionSheet;
  readonly today: CalendarDate;
  readonly introduction: ReactNode;
  readonly coming: ReactNode;
  /** Who keeps the sheet. */
  readonly keeping?: ReactNode;
  /** What was asked for as a day and is none. */
  readonly badDay?: string | undefined;
  /** Set where one edition is read by its number. */
  readonly edition?: { readonly inUseTo: CalendarDate | null } | undefined;
};

/** All that is held on one place, as read on a day or as one edition had it. */
export function RegionSheetPage({ sheet, today, introduction, coming, keeping, badDay, edition }: Props): ReactElement {
  const layers = [sheet, ...sheet.above];
  const names = namesOf(layers);
  const cited = citeSources(citationsOf(sheet));
  const parts = sheetParts({ sheet, names, today, cited, introduction, coming });
  const title = edition === undefined ? sheet.name : words('regions.sheet.titleEdition', { name: sheet.name, number: sheet.edition });
  return (
    <>
      {badDay === undefined ? null : (
        <ErrorSummary heading={words('regions.date.fault')} faults={[{ id: 'on', said: badDayWords(badDay) }]} tries={1} />
      )}
      <div className="flex items-center gap-4">
        <FootRingMark size={64} rings={ringsOf(sheet.kind)} />
        <PageHeading>{title}</PageHeading>
      </div>
      <div className="columns mt-4">
        <div className="main-part">
          <SheetBanner sheet={sheet} names={names} today={today} inUseTo={edition?.inUseTo ?? null} />
          <Remarks sheet={sheet} today={today} edition={edition} />
          {keeping}
          {sheet.kind === 'base' ? null : (
            <p className="mt-6">
              <LinkButton href={`/check?region=${sheet.code}`}>{words('regions.sheet.check', { name: sheet.name })}</LinkButton>
            </p>
          )}
          <AnotherDay sheet={sheet} badDay={badDay} />
        </div>
        <div className="side-part">
          <Contents parts={parts} />
        </div>
      </div>
      {parts.map(({ id, title: heading, body }) => (
        <section key={id} className="mt-12" aria-labelledby={id}>
          <h2 id={id}>{heading}</h2>
          <div className={id === 'limits' ? 'mt-4' : 'mt-4 max-w-text'}>{body}</div>
        </section>
      ))}
      <MoreLinks sheet={sheet} />
      <PrintFoot
        said={words('regions.sheet.printFoot', {
          line: sayPhrases(sheet.line.map((code) => names.regions.get(code) ?? code)),
          date: sayDate(sheet.on),
          number: sheet.edition,
        })}
      />
    </>
  );
}

/** What the page cites: its own sheet, the layers whose rules stand here, and what is only said. Other words and advice stand elsewhere. */
function citationsOf(sheet: RegionSheet): readonly ToldSource[] {
  const layers = [sheet, ...sheet.above];
  const shown = layers.filter(({ kind }) => kind !== 'base' || kind === sheet.kind).flatMap(({ rules }) => rules);
  const coming = layers.flatMap((layer) => layer.coming);
  return [...shown, ...coming, ...alsoSaid(layers), ...sheet.terms].flatMap(({ sources }) => sources);
}

const badDayWords = (asked: string): string => words('regions.date.bad', { asked });

/** Folded, since most come for today; open where what was asked for is no day. */
function AnotherDay({ sheet, badDay }: Pick<Props, 'sheet' | 'badDay'>): ReactElement {
  return (
    <div className="not-in-print mt-3">
      <Disclosure summary={words('regions.date.title')} open={badDay !== undefined}>
        <SheetDateForm code={sheet.code} day={badDay ?? sheet.on} error={badDay === undefined ? undefined : badDayWords(badDay)} />
      </Disclosure>
    </div>
  );
}

function Remarks({ sheet, today, edition }: Pick<Props, 'sheet' | 'today' | 'edition'>): ReactElement | null {
  const now = (said: ReactNode): ReactElement => <a href={`/regions/${sheet.code}`}>{said}</a>;
  const { past } = lookAgain(sheet.rules, today);
  const remarks = [
    ...(edition === undefined && sheet.on !== today ? [words.rich('regions.sheet.notToday', { date: sayDate(sheet.on), now })] : []),
    ...(edition !== undefined && edition.inUseTo !== null ? [words.rich('regions.sheet.earlier', { number: sheet.edition, now })] : []),
    ...(past > 0 ? [words('regions.sheet.past', { count: past })] : []),
  ];
  if (remarks.length === 0) return null;
  return (
    <div className="mt-4 max-w-text">
      <Panel colour="cobalt">
        {remarks.map((remark, place) => (
          <p key={place}>{remark}</p>
        ))}
      </Panel>
    </div>
  );
}

function Contents({ parts }: { readonly parts: readonly SheetPart[] }): ReactElement {
  return (
    <nav className="not-in-print mt-8 lg:mt-0" aria-labelledby="contents">
      <h2 id="contents">{words('regions.sheet.contents')}</h2>
      <ul className="mt-2 font-sans text-plain sm:columns-2 lg:columns-1">
        {parts.map(({ id, title }) => (
          <li key={id}>
            <a className="inline-block py-2" href={`#${id}`}>
              {title}
            </a>
          </li>
        ))}
      </ul>
    </nav>
  );
}

function MoreLinks({ sheet }: Pick<Props, 'sheet'>): ReactElement {
  return (
    <section className="not-in-print mt-12" aria-labelledby="more">
      <h2 id="more">{words('regions.sheet.links')}</h2>
      <ul className="mt-2 font-sans text-plain">
        <li>
          <a className="inline-block py-2" href={`/regions/${sheet.code}/amend`}>
            {words('amend.begin.link')}
          </a>
        </li>
        <li>
          <a className="inline-block py-2" href={`/sources?region=${sheet.code}`}>
            {words('library.sources.ofSheet')}
          </a>
        </li>
        <li>
          <a className="inline-block py-2" href={`/changes?region=${sheet.code}`}>
            {words('library.changes.title')}
          </a>
        </li>
        <li>
          <a className="inline-block py-2" href={`/regions/${sheet.code}/editions`}>
            {words('regions.sheet.editions')}
          </a>
        </li>
        <li>
          <a className="inline-block py-2" href={`/api/v1/regions/${sheet.code}?on=${sheet.on}`}>
            {words('regions.sheet.data')}
          </a>
        </li>
      </ul>
    </section>
  );
}
