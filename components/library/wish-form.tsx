import type { ReactElement } from 'react';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { words } from '@/lib/kernel/words';

export type Wished = { readonly code: string; readonly name: string; readonly count: number };
type Act = (form: FormData) => Promise<void>;

/** Countries without a sheet that were looked for: what that does not mean, how often each was asked for, and a button to ask. */
export function WishedPlaces({ places, act }: { readonly places: readonly Wished[]; readonly act: Act }): ReactElement {
  return (
    <section className="mt-8 flex max-w-text flex-col gap-4" aria-labelledby="no-sheet">
      <h2 id="no-sheet">{words('library.wish.none')}</h2>
      <p>{words('library.wish.noneText', { count: places.length })}</p>
      <ul className="flex flex-col gap-4">
        {places.map(({ code, name, count }) => (
          <li key={code}>
            <form action={act}>
              <input type="hidden" name="region" value={code} />
              <Button kind="plain">{words('library.wish.askFor', { name })}</Button>
            </form>
            <p className="mt-1 font-sans text-plain text-umber">{words('library.wish.count', { count })}</p>
          </li>
        ))}
      </ul>
      <p className="font-sans text-plain text-umber">{words('library.wish.kept')}</p>
    </section>
  );
}

type Props = {
  readonly countries: readonly Wished[];
  readonly chosen?: string | undefined;
  readonly error?: string | undefined;
  readonly act: Act;
};

/** Any country without a sheet, out of a list by name. */
export function WishForm({ countries, chosen, error, act }: Props): ReactElement {
  return (
    <form action={act} className="flex max-w-text flex-col gap-4">
      <SelectField
        id="region"
        name="region"
        label={words('library.wish.label')}
        hint={words('library.wish.hint')}
        error={error}
        none={words('library.wish.choose')}
        options={countries.map(({ code, name }) => ({ value: code, label: name }))}
        chosen={chosen}
      />
      <div>
        <Button>{words('library.wish.button')}</Button>
      </div>
      <p className="font-sans text-plain text-umber">{words('library.wish.kept')}</p>
    </form>
  );
}
