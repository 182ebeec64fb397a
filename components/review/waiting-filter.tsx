import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly places: readonly { readonly code: string; readonly name: string }[];
  readonly region: string | undefined;
  readonly state: string | undefined;
  readonly days: number | undefined;
  readonly sort: string | undefined;
};

const STATES = ['sent', 'held', 'once-approved'] as const;
const DAYS = [1, 3, 7, 14, 30] as const;
const SORTS = ['region', 'size'] as const;

/** Narrows and sorts the sorting table by a plain GET, so that what one sees has an address. */
export function WaitingFilter({ places, region, state, days, sort }: Props): ReactElement {
  return (
    <form action="/sorting-table" method="get" className="waiting-filter" aria-label={words('review.filter.label')}>
      <SelectField
        id="region"
        name="region"
        label={words('review.filter.region')}
        none={words('review.filter.anyRegion')}
        options={places.map(({ code, name }) => ({ value: code, label: name }))}
        chosen={region}
      />
      <SelectField
        id="state"
        name="state"
        label={words('review.filter.state')}
        none={words('review.filter.anyState')}
        options={STATES.map((one) => ({ value: one, label: words(`review.state.${one}`) }))}
        chosen={state}
      />
      <SelectField
        id="days"
        name="days"
        label={words('review.filter.days')}
        none={words('review.filter.anyDays')}
        options={DAYS.map((count) => ({ value: String(count), label: words('review.filter.daysOf', { days: count }) }))}
        chosen={days === undefined ? undefined : String(days)}
      />
      <SelectField
        id="sort"
        name="sort"
        label={words('review.filter.sort')}
        none={words('review.filter.sorts.waiting')}
        options={SORTS.map((one) => ({ value: one, label: words(`review.filter.sorts.${one}`) }))}
        chosen={sort}
      />
      <div>
        <Button kind="plain">{words('review.filter.submit')}</Button>
      </div>
    </form>
  );
}
