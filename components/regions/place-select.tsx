import type { ReactElement } from 'react';
import { SelectField } from '@/components/ui/select-field';
import { LOCALE } from '@/lib/kernel/words';

export type Place = { readonly code: string; readonly name: string };
type Props = {
  readonly label: string;
  /** The words of choosing none. */
  readonly none: string;
  readonly places: readonly Place[];
  readonly chosen: string | undefined;
};

const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });

/** One place or none, by name; sent as `region`. */
export function PlaceSelect({ label, none, places, chosen }: Props): ReactElement {
  return (
    <SelectField
      id="region"
      name="region"
      label={label}
      none={none}
      options={places.toSorted((a, b) => BY_NAME.compare(a.name, b.name)).map(({ code, name }) => ({ value: code, label: name }))}
      chosen={chosen}
    />
  );
}
