import type { ReactElement, ReactNode } from 'react';
import { Caution } from '@/components/checks/caution';
import { DefinitionList } from '@/components/ui/definition-list';
import { Panel } from '@/components/ui/panel';
import type { RegionChecklist } from '@/lib/checks/domain/checklist';
import { limitsOfList } from '@/lib/checks/domain/limits-known';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly regions: readonly RegionChecklist[];
  readonly on: CalendarDate;
  readonly placeNames: ReadonlyMap<string, string>;
  readonly children?: ReactNode;
};

/** R1, first of all: for when, read from which sheets in which editions, and that it is no proof. */
export function ReportBanner({ regions, on, placeNames, children }: Props): ReactElement {
  const names = regions.flatMap(({ authorities }) => authorities.slice(0, 1).map(({ name }) => name));
  return (
    <>
      <p className="mt-4">{words('checks.result.drawn', { date: sayDate(on) })}</p>
      <div className="mt-4">
        <Caution seenOn={firstSeen(regions) ?? on} authority={names.length === 0 ? undefined : sayList([...new Set(names)])} />
      </div>
      {regions.map((region) => (
        <LimitsUnknown key={region.code} region={region} name={placeNames.get(region.code) ?? region.code} />
      ))}
      <div className="mt-4">
        <DefinitionList
          entries={regions.map((region) => ({
            id: region.code,
            name: `${words('checks.result.line')}: ${placeNames.get(region.code) ?? region.code}`,
            value: <Line region={region} placeNames={placeNames} />,
          }))}
        />
      </div>
      <p className="mt-2 font-sans text-small text-umber">
        {words.rich('checks.result.base', { link: (said) => <a href="/regions/care">{said}</a> })}
      </p>
      {children}
    </>
  );
}

/** Says that a list is silent on limits because we do not know them, not because there are none. */
function LimitsUnknown({ region, name }: { readonly region: RegionChecklist; readonly name: string }): ReactElement | null {
  const known = limitsOfList(region.rules);
  if (known === 'some') return null;
  const [authority] = region.authorities;
  return (
    <div className="mt-4">
      <Panel colour="ash">
        <p>
          {words.rich(`checks.result.limits.${known}`, { place: name, strong: (said) => <strong className="font-strong">{said}</strong> })}{' '}
          {authority === undefined
            ? words('checks.result.limits.askThem')
            : words('checks.result.limits.ask', { authority: authority.name })}
        </p>
      </Panel>
    </div>
  );
}

function Line({ region, placeNames }: { readonly region: RegionChecklist; readonly placeNames: Props['placeNames'] }): ReactElement {
  return (
    <>
      {region.line.map((code, place) => (
        <span key={code}>
          {place === 0 ? null : ' → '}
          <a href={`/regions/${code}`}>
            {words('checks.result.edition', { region: placeNames.get(code) ?? code, number: region.editions[code] ?? 0 })}
          </a>
        </span>
      ))}
    </>
  );
}

function firstSeen(regions: Props['regions']): CalendarDate | null {
  const days = regions.flatMap(({ rules }) =>
    rules.flatMap(({ sources }) => sources.flatMap(({ seenOn }) => (seenOn === undefined ? [] : [seenOn]))),
  );
  return days.sort()[0] ?? null;
}
