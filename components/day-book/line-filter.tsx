import type { ReactElement } from 'react';
import { PlaceSelect, type Place } from '@/components/regions/place-select';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { ACT_KINDS } from '@/lib/day-book/domain/kinds';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly kind: string | undefined;
  readonly region: string | undefined;
  readonly places: readonly Place[];
  /** As they were typed. */
  readonly from: string;
  readonly until: string;
  readonly wrong: readonly ('from' | 'until')[];
};

/** Asks for lines by a plain GET, so that what was found has an address. */
export function LineFilter({ kind, region, places, from, until, wrong }: Props): ReactElement {
  const day = (name: 'from' | 'until', typed: string): ReactElement => (
    <TextField
      id={name}
      name={name}
      label={words(`day-book.filter.${name}`)}
      hint={words('day-book.filter.dateHint')}
      error={wrong.includes(name) ? words('day-book.filter.dateWrong') : undefined}
      defaultValue={typed}
      maxLength={10}
      autoComplete="off"
    />
  );
  return (
    <form
      action="/day-book"
      method="get"
      className="not-in-print flex max-w-text flex-col gap-4"
      aria-label={words('day-book.filter.label')}
    >
      <SelectField
        id="kind"
        name="kind"
        label={words('day-book.filter.kind')}
        none={words('day-book.filter.kindNone')}
        options={ACT_KINDS.map((one) => ({ value: one, label: words(`day-book.filter.kinds.${one}`) }))}
        chosen={kind}
      />
      <PlaceSelect label={words('day-book.filter.region')} none={words('day-book.filter.regionNone')} places={places} chosen={region} />
      {day('from', from)}
      {day('until', until)}
      <div>
        <Button kind="plain">{words('day-book.filter.submit')}</Button>
      </div>
    </form>
  );
}
