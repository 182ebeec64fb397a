import type { ReactElement } from 'react';
import { controlProps, Field } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { words, wordsAt } from '@/lib/kernel/words';
import type { PlaceChoice } from '@/lib/regions/domain/form-ground';
import { TOPICS } from '@/lib/regions/domain/payload-fields';
import type { ItemList } from '@/lib/regions/domain/sheet-items';
import { HiddenFields } from './hidden-fields';

type Props = {
  readonly action: (form: FormData) => Promise<void>;
  readonly hidden: Readonly<Record<string, string>>;
  readonly list: ItemList;
  readonly topic: string;
  readonly places: readonly PlaceChoice[];
  readonly isNameless: boolean;
};

/** What something new is called, and what a rule is about: enough to begin its form. */
export function NewPart({ action, hidden, list, topic, places, isNameless }: Props): ReactElement {
  const error = isNameless ? words('amend.fault.needed') : undefined;
  const said = { label: words(`amend.new.name.${list}`), hint: hintOf(list), error };
  return (
    <form action={action} noValidate className="mt-6 flex max-w-text flex-col gap-6">
      <HiddenFields values={hidden} />
      {list === 'memberships' ? (
        <SelectField
          id="name"
          name="name"
          none={words('amend.form.choose')}
          options={places.map(({ code, name }) => ({ value: code, label: name }))}
          label={said.label}
          error={error}
        />
      ) : (
        <Field id="name" {...said}>
          <input type="text" className="control" name="name" maxLength={120} autoFocus={isNameless} {...controlProps('name', said)} />
        </Field>
      )}
      {list === 'rules' ? (
        <SelectField
          id="topic"
          name="topic"
          label={words('amend.payload.topic')}
          none={words('amend.form.choose')}
          chosen={topic}
          options={TOPICS.map((value) => ({ value, label: wordsAt(`amend.topic.${value}`) ?? value }))}
        />
      ) : null}
      <div>
        <button type="submit" className="button button-primary">
          {words('amend.new.button')}
        </button>
      </div>
    </form>
  );
}

const hintOf = (list: ItemList): string | undefined =>
  list === 'rules' || list === 'terms' || list === 'sources' || list === 'trials' ? words('amend.new.hint') : undefined;
