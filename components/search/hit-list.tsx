import type { ReactElement } from 'react';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { sayDate, sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { dayBefore, lifeOn } from '@/lib/regions/domain/rule-dates';
import type { Strength } from '@/lib/regions/domain/rule';
import type { SearchKind } from '@/lib/search/domain/entry';
import type { Stretch } from '@/lib/search/domain/matched-sentence';

export type ShownHit = {
  readonly address: string;
  readonly kind: SearchKind;
  readonly title: string;
  readonly sheet: string | null;
  readonly speaksOf: readonly string[];
  readonly sentence: readonly Stretch[];
  readonly strength: Strength | null;
  readonly from: CalendarDate | null;
  readonly to: CalendarDate | null;
  readonly lookAgainBy: CalendarDate | null;
  readonly isHere: boolean;
};

type Props = { readonly hits: readonly ShownHit[]; readonly today: CalendarDate; readonly placeName: string | null };

/** What was found. With a place named, its own part stands first and the other places' part says so. */
export function HitList({ hits, today, placeName }: Props): ReactElement {
  if (placeName === null) return <Hits hits={hits} today={today} label={words('search.answers')} isPart={false} />;
  const [here, others] = [hits.filter(({ isHere }) => isHere), hits.filter(({ isHere }) => !isHere)];
  return (
    <>
      {here.length === 0 ? null : <Hits hits={here} today={today} label={words('search.place.here', { name: placeName })} isPart />}
      {others.length === 0 ? null : <Hits hits={others} today={today} label={words('search.place.others')} isPart />}
    </>
  );
}

type HitsProps = Pick<Props, 'hits' | 'today'> & { readonly label: string; readonly isPart: boolean };

function Hits({ hits, today, label, isPart }: HitsProps): ReactElement {
  return (
    <section className="mt-6">
      <h2 className={isPart ? '' : 'sr-only'}>{label}</h2>
      <ol className="hits mt-4" role="list">
        {hits.map((hit) => (
          <li key={hit.address}>
            <h3>
              <a href={hit.address}>{hit.title}</a>
            </h3>
            <p className="font-sans text-plain text-umber">{aboutOf(hit, today).join(' · ')}</p>
            <p>
              {hit.sentence.map(({ text, isMet }, place) => (isMet ? <mark key={place}>{text}</mark> : <span key={place}>{text}</span>))}
            </p>
          </li>
        ))}
      </ol>
    </section>
  );
}

/** What it is, of what place, how strong, and what of its dates a reader must know. */
function aboutOf(hit: ShownHit, today: CalendarDate): readonly string[] {
  const { kind, sheet, strength, speaksOf } = hit;
  const kindName = words(`search.kinds.${kind}`);
  return [
    sheet === null || kind === 'region' ? kindName : words('search.hit.of', { kind: kindName, place: sheet }),
    ...(strength === null ? [] : [words(`search.hit.strength.${strength}`)]),
    ...(speaksOf.length === 0 ? [] : [words('search.hit.speaks', { places: sayList(speaksOf) })]),
    ...lifeLine(hit, today),
    ...lookAgainLine(hit, today),
  ];
}

function lifeLine({ from, to }: Pick<ShownHit, 'from' | 'to'>, today: CalendarDate): readonly string[] {
  const life = lifeOn({ from, to }, today);
  if (life === 'coming' && from !== null) return [words('search.hit.coming', { date: sayDate(from) })];
  return life === 'ended' && to !== null ? [words('search.hit.ended', { date: sayDate(dayBefore(to)) })] : [];
}

function lookAgainLine({ kind, lookAgainBy }: Pick<ShownHit, 'kind' | 'lookAgainBy'>, today: CalendarDate): readonly string[] {
  if (lookAgainBy === null) return [];
  if (lookAgainBy < today) return [words('search.hit.past', { date: sayDate(lookAgainBy) })];
  return kind === 'note' ? [words('search.hit.lookAgain', { date: sayDate(lookAgainBy) })] : [];
}
