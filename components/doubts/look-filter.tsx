import type { ReactElement } from 'react';
import { PlaceSelect, type Place } from '@/components/regions/place-select';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly places: readonly Place[];
  /** The others who keep a sheet; one may stand there several times. */
  readonly keepers: readonly { readonly accountId: string; readonly name: string }[];
  readonly region: string | undefined;
  readonly keeper: string | undefined;
  /** As it was typed. */
  readonly days: string;
  readonly error: string | undefined;
};

/** Narrows the list of rules to look at again: a plain GET, so that the address says what is shown. */
export function LookFilter({ places, keepers, region, keeper, days, error }: Props): ReactElement {
  const others = [...new Map(keepers.map(({ accountId, name }) => [accountId, name]))];
  return (
    <form action="/look-again" method="get" className="not-in-print mt-6 flex max-w-text flex-col gap-4">
      <PlaceSelect label={words('doubts.look.place')} none={words('doubts.look.anyPlace')} places={places} chosen={region} />
      <SelectField
        id="keeper"
        name="keeper"
        label={words('doubts.look.keeper')}
        none={words('doubts.look.anyKeeper')}
        options={[
          { value: 'me', label: words('doubts.look.me') },
          { value: 'nobody', label: words('doubts.look.nobody') },
          ...others.map(([value, label]) => ({ value, label })),
        ]}
        chosen={keeper}
      />
      <TextField
        id="days"
        name="days"
        label={words('doubts.look.days')}
        hint={words('doubts.look.daysHint')}
        error={error}
        defaultValue={days}
        inputMode="numeric"
        maxLength={10}
        autoComplete="off"
      />
      <div>
        <Button kind="plain">{words('doubts.look.filter')}</Button>
      </div>
    </form>
  );
}
