import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { controlProps, Field } from '@/components/ui/field';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly code: string;
  /** What stands in the field: the day shown, or what was asked and is no day. */
  readonly day: string;
  readonly error?: string | undefined;
};

/** Asks for another day by a plain GET; the page sends it on to the address of that day. */
export function SheetDateForm({ code, day, error }: Props): ReactElement {
  const said = { label: words('regions.date.label'), hint: words('regions.date.hint'), error };
  return (
    <form action={`/regions/${code}`} method="get" className="not-in-print flex flex-wrap items-end gap-3">
      <div className="w-full max-w-field">
        <Field id="on" {...said}>
          <input
            type="text"
            inputMode="numeric"
            name="on"
            defaultValue={day}
            className="control"
            maxLength={10}
            autoComplete="off"
            {...controlProps('on', said)}
          />
        </Field>
      </div>
      <Button kind="plain">{words('regions.date.button')}</Button>
    </form>
  );
}
