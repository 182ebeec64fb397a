import type { ReactElement } from 'react';
import { PlaceSelect, type Place } from '@/components/regions/place-select';
import { Button } from '@/components/ui/button';
import { Field, hintId } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { words } from '@/lib/kernel/words';
import { SEARCH_KINDS, type SearchKind } from '@/lib/search/domain/entry';
import { SearchField } from './search-field';

type Props = {
  readonly asked: string;
  readonly kind: SearchKind | null;
  readonly region: string | null;
  readonly places: readonly Place[];
};

/** Words, a kind and the reader's place, sent as a plain GET: all of it stays in the address. */
export function SearchForm({ asked, kind, region, places }: Props): ReactElement {
  const hint = words('search.field.hint');
  return (
    <search aria-label={words('search.title')}>
      <form action="/search" method="get" className="not-in-print mt-6 flex max-w-text flex-col gap-4">
        <Field id="q" label={words('search.field.label')} hint={hint}>
          <SearchField id="q" asked={asked} describedBy={hintId('q')} />
        </Field>
        <div className="flex flex-wrap gap-4">
          <SelectField
            id="kind"
            name="kind"
            label={words('search.field.kind')}
            none={words('search.field.allKinds')}
            options={SEARCH_KINDS.map((value) => ({ value, label: words(`search.many.${value}`) }))}
            chosen={kind ?? undefined}
          />
          <PlaceSelect
            label={words('search.field.region')}
            none={words('search.field.allRegions')}
            places={places}
            chosen={region ?? undefined}
          />
        </div>
        <div>
          <Button>{words('search.field.button')}</Button>
        </div>
      </form>
    </search>
  );
}
