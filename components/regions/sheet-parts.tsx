import type { ReactNode } from 'react';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import type { CitedSources } from '@/lib/regions/domain/cited-sources';
import { limitRows } from '@/lib/regions/domain/limit-rows';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import { alsoSaid, contactsOf, groupRules } from '@/lib/regions/domain/sheet-reading';
import type { RegionSheet, SheetLayer } from '@/lib/regions/domain/told-sheet';
import { CitedList } from './cited-list';
import { ContactList } from './contact-list';
import { LeftOutList } from './left-out-list';
import { LimitsTable } from './limits-table';
import { RuleCard } from './rule-card';
import { AdviceAbove, LayerAbove, RulesByTopic } from './sheet-rules';
import { TermList } from './term-list';

/** A sheet with all that its parts need: names, numbered sources, the day of reading, its texts drawn from Markdown. */
export type SheetView = {
  readonly sheet: RegionSheet;
  readonly names: SheetNames;
  readonly today: CalendarDate;
  readonly cited: CitedSources;
  readonly introduction: ReactNode;
  readonly coming: ReactNode;
};

export type SheetPart = { readonly id: string; readonly title: string; readonly body: ReactNode };
type MaybePart = SheetPart | null;

/** The parts of a sheet in their order; a part with nothing in it is left out, unless its absence is news. */
export function sheetParts(view: SheetView): readonly SheetPart[] {
  return [
    aboutPart(view),
    rulesPart(view),
    abovePart(view),
    carePart(view),
    leftOutPart(view),
    limitsPart(view),
    termsPart(view),
    alsoPart(view),
    comingPart(view),
    gapsPart(view),
    askPart(view),
    sourcesPart(view),
  ].flatMap((part) => (part === null ? [] : [part]));
}

const cardProps = ({ sheet, names, today, cited }: SheetView) => ({
  names,
  today,
  numberOf: cited.numberOf,
  authority: contactsOf(sheet, 'authorities')[0]?.name ?? null,
});

const aboutPart = ({ introduction }: SheetView): SheetPart => ({
  id: 'about',
  title: words('regions.part.about'),
  body: <div className="prose">{introduction}</div>,
});

function rulesPart(view: SheetView): SheetPart {
  const { sheet, today } = view;
  const none = sheet.on === today ? 'regions.rules.none' : 'regions.rules.noneOnDay';
  const body =
    groupRules(sheet.rules).length === 0 ? (
      <p>{words(none, { name: sheet.name })}</p>
    ) : (
      <RulesByTopic rules={sheet.rules} {...cardProps(view)} />
    );
  return { id: 'rules', title: words('regions.part.rules', { name: sheet.name }), body };
}

const isCare = ({ kind }: SheetLayer): boolean => kind === 'base';
const leftOutOf = ({ notInherited }: RegionSheet): ReadonlySet<string> => new Set(notInherited.map(({ rule }) => rule));

function abovePart({ sheet, cited }: SheetView): MaybePart {
  const layers = sheet.above.filter((layer) => !isCare(layer));
  if (layers.length === 0) return null;
  const body = layers.map((layer) => <LayerAbove key={layer.code} layer={layer} leftOut={leftOutOf(sheet)} numberOf={cited.numberOf} />);
  return { id: 'above', title: words('regions.part.above'), body };
}

function carePart({ sheet }: SheetView): MaybePart {
  const layers = sheet.above.filter(isCare);
  if (layers.length === 0) return null;
  const body = layers.map((layer) => <AdviceAbove key={layer.code} layer={layer} leftOut={leftOutOf(sheet)} />);
  return { id: 'care', title: words('regions.part.care'), body };
}

function leftOutPart({ sheet }: SheetView): MaybePart {
  if (sheet.notInherited.length === 0) return null;
  return { id: 'left-out', title: words('regions.part.leftOut'), body: <LeftOutList sheet={sheet} /> };
}

function limitsPart({ sheet, names }: SheetView): MaybePart {
  if (sheet.kind === 'base') return null;
  const rows = limitRows(sheet, names);
  const table = (
    <>
      <p className="mb-4 max-w-text">{words('regions.limits.lead')}</p>
      <LimitsTable rows={rows} place={sheet} names={names} />
    </>
  );
  return { id: 'limits', title: words('regions.part.limits'), body: rows.length === 0 ? <p>{words('regions.limits.none')}</p> : table };
}

function termsPart({ sheet, names, cited }: SheetView): MaybePart {
  if (sheet.terms.length === 0) return null;
  const body = (
    <>
      <p>{words('regions.terms.lead')}</p>
      <TermList terms={sheet.terms} names={names} numberOf={cited.numberOf} />
      {sheet.line.length > 1 ? <p className="mt-4 text-umber">{words('regions.terms.elsewhere')}</p> : null}
    </>
  );
  return { id: 'terms', title: words('regions.part.terms'), body };
}

function alsoPart(view: SheetView): MaybePart {
  const rules = alsoSaid([view.sheet, ...view.sheet.above]);
  if (rules.length === 0) return null;
  const body = (
    <>
      <p>{words('regions.rules.also')}</p>
      {rules.map((rule) => (
        <RuleCard key={rule.id} rule={rule} level={3} {...cardProps(view)} />
      ))}
    </>
  );
  return { id: 'also', title: words('regions.part.also'), body };
}

function comingPart(view: SheetView): MaybePart {
  const rules = [view.sheet, ...view.sheet.above].flatMap(({ coming }) => coming);
  const cards = (
    <>
      <p>{words('regions.rules.comingRules')}</p>
      {rules.map((rule) => (
        <RuleCard key={rule.id} rule={rule} level={3} {...cardProps(view)} />
      ))}
    </>
  );
  const body = (
    <>
      {rules.length === 0 ? null : cards}
      {view.coming === null ? null : <div className="prose mt-4">{view.coming}</div>}
      {rules.length === 0 && view.coming === null ? <p>{words('regions.rules.comingNone')}</p> : null}
    </>
  );
  return { id: 'coming', title: words('regions.part.coming'), body };
}

function gapsPart({ sheet }: SheetView): MaybePart {
  if (sheet.gaps.length === 0) return null;
  const body = (
    <ul className="prose list-disc ps-6">
      {sheet.gaps.map((gap) => (
        <li key={gap}>{gap}</li>
      ))}
    </ul>
  );
  return { id: 'gaps', title: words('regions.part.gaps'), body };
}

function askPart({ sheet, names }: SheetView): SheetPart {
  const authorities = contactsOf(sheet, 'authorities');
  const accreditation = contactsOf(sheet, 'accreditation');
  const list = { own: sheet.code, names };
  const body = (
    <>
      <h3>{words('regions.ask.authorities')}</h3>
      {authorities.length === 0 ? <p>{words('regions.ask.noAuthority')}</p> : <ContactList contacts={authorities} {...list} />}
      <h3 className="mt-6">{words('regions.ask.accreditation')}</h3>
      <p>{words(accreditation.length === 0 ? 'regions.ask.noAccreditation' : 'regions.ask.labs')}</p>
      <ContactList contacts={accreditation} {...list} />
    </>
  );
  return { id: 'ask', title: words('regions.part.ask'), body };
}

const sourcesPart = ({ cited }: SheetView): MaybePart =>
  cited.list.length === 0 ? null : { id: 'sources', title: words('regions.part.sources'), body: <Sources cited={cited} /> };

const Sources = ({ cited }: Pick<SheetView, 'cited'>): ReactNode => (
  <>
    <p className="mb-4">{words('regions.source.passages')}</p>
    <CitedList list={cited.list} />
  </>
);
