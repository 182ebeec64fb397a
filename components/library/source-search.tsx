import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { Field, controlProps } from '@/components/ui/field';
import { PlaceSelect, type Place } from '@/components/regions/place-select';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly asked: string;
  readonly places: readonly Place[];
  readonly chosen: string | undefined;
};

/** Words and a place, sent as a plain GET. */
export function SourceSearch({ asked, places, chosen }: Props): ReactElement {
  const said = { label: words('library.sources.search.label'), hint: words('library.sources.search.hint') };
  return (
    <search>
      <form action="/sources" method="get" className="not-in-print mt-6 flex max-w-text flex-col gap-4">
        <Field id="q" {...said}>
          <input
            className="control"
            type="search"
            name="q"
            autoComplete="off"
            maxLength={80}
            defaultValue={asked}
            {...controlProps('q', said)}
          />
        </Field>
        <PlaceSelect label={words('library.filter.label')} none={words('library.filter.all')} places={places} chosen={chosen} />
        <div>
          <Button kind="plain">{words('library.sources.search.button')}</Button>
        </div>
      </form>
    </search>
  );
}
