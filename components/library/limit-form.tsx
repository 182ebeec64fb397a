import type { ReactElement } from 'react';
import { PlaceChoices, type PlaceChoice } from '@/components/site/place-choices';
import { Button } from '@/components/ui/button';
import { Field, controlProps } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { words } from '@/lib/kernel/words';
import { saySubstance } from '@/lib/regions/domain/figure-words';

type Props = {
  readonly places: readonly PlaceChoice[];
  readonly chosen: readonly string[];
  readonly substances: readonly string[];
  readonly symbol: string;
  readonly ware: string;
};

/** What to hold side by side: places, a substance, perhaps a kind of ware. A plain GET, so that the address is the table. */
export function LimitForm({ places, chosen, substances, symbol, ware }: Props): ReactElement {
  const said = { label: words('library.limits.form.ware'), hint: words('library.limits.form.wareHint') };
  return (
    <form action="/limits" method="get" className="not-in-print mt-6 flex max-w-text flex-col gap-6">
      <PlaceChoices
        id="region"
        name="region"
        legend={words('library.limits.form.places')}
        hint={words('library.limits.form.placesHint')}
        places={places}
        chosen={chosen}
      />
      <SelectField
        id="substance"
        name="substance"
        label={words('library.limits.form.substance')}
        none={words('library.limits.form.leadFirst')}
        options={substances.map((one) => ({ value: one.toLowerCase(), label: saySubstance(one) }))}
        chosen={symbol.toLowerCase()}
      />
      <Field id="ware" {...said}>
        <input className="control" name="ware" autoComplete="off" maxLength={80} defaultValue={ware} {...controlProps('ware', said)} />
      </Field>
      <div>
        <Button>{words('library.limits.form.button')}</Button>
      </div>
    </form>
  );
}
