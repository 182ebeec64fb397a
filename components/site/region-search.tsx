import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { controlProps, Field } from '@/components/ui/field';
import { words } from '@/lib/kernel/words';

/** Finds a place by name: a plain GET to the list of regions, which is also there to be read. */
export function RegionSearch({ asked }: { readonly asked?: string }): ReactElement {
  const said = { label: words('home.find.label'), hint: words('home.find.hint') };
  return (
    <search>
      <form action="/regions" method="get">
        <Field id="place" {...said}>
          <div className="flex flex-wrap gap-3">
            <input
              className="control"
              type="search"
              name="q"
              autoComplete="off"
              maxLength={80}
              defaultValue={asked}
              {...controlProps('place', said)}
            />
            <Button kind="plain">{words('home.find.button')}</Button>
          </div>
        </Field>
      </form>
    </search>
  );
}
