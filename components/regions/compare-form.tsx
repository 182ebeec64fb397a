import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Edition = { readonly number: number; readonly inUseFrom: string };

type Props = {
  readonly code: string;
  readonly editions: readonly Edition[];
  readonly from: number | null;
  readonly to: number | null;
};

/** Asks for two editions by a plain GET. */
export function CompareForm({ code, editions, from, to }: Props): ReactElement {
  const options = editions.toReversed().map(({ number, inUseFrom }) => ({
    value: String(number),
    label: words('editions.option', { number, date: sayDate(calendarDateOf(new Date(inUseFrom))) }),
  }));
  const chosen = { from, to };
  return (
    <form action={`/regions/${code}/editions/compare`} method="get" className="not-in-print mt-6">
      <fieldset>
        <legend className="font-sans text-plain font-strong">{words('editions.choose')}</legend>
        <div className="mt-2 flex flex-wrap items-end gap-4">
          {(['from', 'to'] as const).map((side) => (
            <div key={side} className="w-full max-w-field">
              <SelectField
                id={side}
                name={side}
                label={words(`editions.${side}`)}
                none={words('editions.none')}
                options={options}
                chosen={chosen[side] === null ? undefined : String(chosen[side])}
              />
            </div>
          ))}
          <Button kind="plain">{words('editions.button')}</Button>
        </div>
      </fieldset>
    </form>
  );
}
