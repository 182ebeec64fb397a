import type { ReactElement } from 'react';
import { CitedList } from '@/components/regions/cited-list';
import { LinkButton } from '@/components/ui/link-button';
import type { LoadedLine, RegionChecklist } from '@/lib/checks/domain/checklist';
import { sectionsOf } from '@/lib/checks/domain/sections';
import type { Explanation } from '@/lib/checks/domain/why';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { citeSources } from '@/lib/regions/domain/cited-sources';
import { tellRule } from '@/lib/regions/domain/told-rule';
import { ComparisonTable } from './comparison-table';
import type { ListView } from './list-view';
import { PlaceChecklist } from './place-checklist';

export type Report = {
  readonly regions: readonly RegionChecklist[];
  readonly lines: readonly LoadedLine[];
  readonly openQuestions: readonly ReadonlyMap<string, readonly string[]>[];
  readonly explanation: Explanation;
  readonly declined: readonly string[];
  readonly placeNames: ReadonlyMap<string, string>;
  readonly today: CalendarDate;
  /** Address of this page; `?place=` shows one of several places. */
  readonly here: string;
  /** Address of the check, to answer from the list; null on a dated copy. */
  readonly base: string | null;
  /** The place to show in full; null shows several side by side. */
  readonly place: string | null;
};

/** One place's whole list, or several side by side with a way on to each. */
export function ChecklistReport(report: Report): ReactElement {
  const { regions, placeNames, here } = report;
  const index = regions.length === 1 ? 0 : regions.findIndex(({ code }) => code === report.place);
  const region = regions[index];
  const line = report.lines[index];
  if (region !== undefined && line !== undefined) return <OnePlace report={report} region={region} line={line} index={index} />;
  return (
    <section className="mt-8" aria-labelledby="compare">
      <h2 id="compare">{words('checks.compare.title')}</h2>
      <ComparisonTable regions={regions} placeNames={placeNames} here={here} />
      <h2 className="mt-8">{words('checks.compare.full')}</h2>
      <ul className="mt-2 flex flex-wrap gap-4">
        {regions.map(({ code }) => (
          <li key={code}>
            <LinkButton kind="plain" href={`${here}?place=${code}`}>
              {words('checks.result.titleOf', { places: placeNames.get(code) ?? code })}
            </LinkButton>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** Parts whose lines show their sources; the lines of the others lead to their own pages. */
const CITING = ['sources-disagree', 'applies', 'treat-as-applying', 'not-settled', 'notes', 'said'] as const;

type OneProps = { readonly report: Report; readonly region: RegionChecklist; readonly line: LoadedLine; readonly index: number };

function OnePlace({ report, region, line, index }: OneProps): ReactElement {
  const rules = line.layers.flatMap(({ sheet }) => sheet.rules.map((rule) => tellRule(rule, sheet.sources)));
  const told = new Map(rules.map((rule) => [rule.id, rule]));
  const sections = sectionsOf(region.rules);
  const cited = citeSources(CITING.flatMap((part) => sections[part]).flatMap(({ id }) => told.get(id)?.sources ?? []));
  const view: ListView = {
    ...report,
    code: region.code,
    told,
    sheetNames: namesOfLine(line),
    open: report.openQuestions[index] ?? new Map(),
    whys: report.explanation.whys,
    authority: region.authorities[0]?.name ?? null,
    numberOf: cited.numberOf,
  };
  return (
    <>
      {report.regions.length === 1 ? null : (
        <p className="mt-4">
          <a href={report.here}>{words('checks.compare.back')}</a>
        </p>
      )}
      <PlaceChecklist region={region} view={view} timeline={report.explanation.timeline} />
      <section className="mt-8" aria-labelledby="sources">
        <h2 id="sources">{words('checks.result.sources')}</h2>
        <p className="mb-4">{words('checks.result.sourcesText')}</p>
        <CitedList list={cited.list} brief />
      </section>
    </>
  );
}

function namesOfLine({ layers }: LoadedLine): ListView['sheetNames'] {
  const terms = layers.flatMap(({ sheet }) =>
    sheet.terms.map(({ id, name, category }) => [id, { name, region: sheet.code, category }] as const),
  );
  return { terms: new Map(terms), regions: new Map(layers.map(({ sheet }) => [sheet.code, sheet.name])) };
}
