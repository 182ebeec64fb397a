import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { LOCALE, words } from '@/lib/kernel/words';

type Place = { readonly code: string; readonly name: string };
type Props = { readonly action: string; readonly places: readonly Place[]; readonly chosen: string | undefined };

const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });

/** Narrows a page to one place: a plain GET, so that the address says what is shown. */
export function PlaceFilter({ action, places, chosen }: Props): ReactElement {
  return (
    <form action={action} method="get" className="not-in-print mt-6 flex max-w-text flex-wrap items-end gap-3">
      <SelectField
        id="region"
        name="region"
        label={words('library.filter.label')}
        none={words('library.filter.all')}
        options={places.toSorted((a, b) => BY_NAME.compare(a.name, b.name)).map(({ code, name }) => ({ value: code, label: name }))}
        chosen={chosen}
      />
      <Button kind="plain">{words('library.filter.button')}</Button>
    </form>
  );
}
