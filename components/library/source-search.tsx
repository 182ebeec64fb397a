import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { Field, controlProps } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { LOCALE, words } from '@/lib/kernel/words';

type Props = {
  readonly asked: string;
  readonly places: readonly { readonly code: string; readonly name: string }[];
  readonly chosen: string | undefined;
};

const BY_NAME = new Intl.Collator(LOCALE, { sensitivity: 'base' });

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
        <SelectField
          id="region"
          name="region"
          label={words('library.filter.label')}
          none={words('library.filter.all')}
          options={places.toSorted((a, b) => BY_NAME.compare(a.name, b.name)).map(({ code, name }) => ({ value: code, label: name }))}
          chosen={chosen}
        />
        <div>
          <Button kind="plain">{words('library.sources.search.button')}</Button>
        </div>
      </form>
    </search>
  );
}
