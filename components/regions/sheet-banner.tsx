import type { ReactElement } from 'react';
import { Caution } from '@/components/checks/caution';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { placeWords } from '@/lib/regions/domain/condition-words';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import { contactsOf, earliestSeen, lookAgain } from '@/lib/regions/domain/sheet-reading';
import type { RegionSheet } from '@/lib/regions/domain/told-sheet';
import { ContactName } from './contact-list';

type Props = {
  readonly sheet: RegionSheet;
  readonly names: SheetNames;
  readonly today: CalendarDate;
  /** Of an edition that was read by its number: the day another took its place; null while it is in use. */
  readonly inUseTo: CalendarDate | null;
};

/** How the sheet is read: its line, the day, the edition, and that none of it is proof. */
export function SheetBanner({ sheet, names, today, inUseTo }: Props): ReactElement {
  const { next } = lookAgain(sheet.rules, today);
  const [authority] = contactsOf(sheet, 'authorities');
  const seenOn = earliestSeen([sheet, ...sheet.above].flatMap(({ rules }) => rules)) ?? sheet.on;
  return (
    <section aria-label={words('regions.sheet.banner')} className="max-w-text">
      <dl className="definitions">
        <div>
          <dt>{words('regions.sheet.line')}</dt>
          <dd>
            <RegionLine sheet={sheet} names={names} />
          </dd>
        </div>
        <Entry name={words('regions.sheet.on')}>
          <time dateTime={sheet.on}>
            {sheet.on === today ? words('regions.sheet.today', { date: sayDate(sheet.on) }) : sayDate(sheet.on)}
          </time>
        </Entry>
        <Entry name={words('regions.sheet.edition')}>
          <EditionWords sheet={sheet} inUseTo={inUseTo} /> (
          <a href={`/regions/${sheet.code}/editions`}>{words('regions.sheet.editions')}</a>)
        </Entry>
        {next === null ? null : (
          <Entry name={words('regions.sheet.lookAgain')}>
            <time dateTime={next}>{sayDate(next)}</time>
          </Entry>
        )}
      </dl>
      <div className="mt-4">
        <Caution seenOn={seenOn} authority={authority === undefined ? undefined : <ContactName contact={authority} />} />
      </div>
    </section>
  );
}

type EntryProps = { readonly name: string; readonly children: React.ReactNode };

function Entry({ name, children }: EntryProps): ReactElement {
  return (
    <div>
      <dt>{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}

function EditionWords({ sheet, inUseTo }: Pick<Props, 'sheet' | 'inUseTo'>): ReactElement {
  const date = sayDate(calendarDateOf(sheet.inUseFrom));
  const number = sheet.edition;
  if (inUseTo === null) return <>{words('regions.sheet.editionSince', { number, date })}</>;
  return <>{words('regions.sheet.editionSpan', { number, date, until: sayDate(inUseTo) })}</>;
}

/** From the widest layer to the place itself, each a link to its own sheet. */
function RegionLine({ sheet, names }: Pick<Props, 'sheet' | 'names'>): ReactElement {
  return (
    <ol className="flex flex-wrap gap-x-2">
      {sheet.line.map((code, place) => (
        <li key={code} className="flex gap-x-2">
          {place === 0 ? null : <span aria-hidden="true">›</span>}
          <Layer code={code} sheet={sheet} names={names} />
        </li>
      ))}
    </ol>
  );
}

function Layer({ code, sheet, names }: Pick<Props, 'sheet' | 'names'> & { readonly code: string }): ReactElement {
  if (code === sheet.code) return <span>{words('regions.sheet.own', { name: sheet.name })}</span>;
  const name = names.regions.get(code);
  return name === undefined ? <span>{placeWords(code)}</span> : <a href={`/regions/${code}`}>{name}</a>;
}
