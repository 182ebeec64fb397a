import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { PlaceSelect, type Place } from '@/components/regions/place-select';
import { words } from '@/lib/kernel/words';

type Props = { readonly action: string; readonly places: readonly Place[]; readonly chosen: string | undefined };

/** Narrows a page to one place: a plain GET, so that the address says what is shown. */
export function PlaceFilter({ action, places, chosen }: Props): ReactElement {
  return (
    <form action={action} method="get" className="not-in-print mt-6 flex max-w-text flex-wrap items-end gap-3">
      <PlaceSelect label={words('library.filter.label')} none={words('library.filter.all')} places={places} chosen={chosen} />
      <Button kind="plain">{words('library.filter.button')}</Button>
    </form>
  );
}
