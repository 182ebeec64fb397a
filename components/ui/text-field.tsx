import type { ComponentProps, ReactElement } from 'react';
import { controlProps, Field, type FieldWords } from './field';

type Input = Pick<ComponentProps<'input'>, 'name' | 'defaultValue' | 'autoComplete' | 'inputMode' | 'maxLength' | 'spellCheck' | 'lang'>;
type Props = Input & FieldWords & { readonly id: string; readonly type?: 'text' | 'email' | 'search' | 'url' | 'password' };

/** One line of text. Required is the norm; what is optional says so in its label. */
export function TextField({ id, label, hint, error, type = 'text', ...input }: Props): ReactElement {
  const said = { label, hint, error };
  return (
    <Field id={id} {...said}>
      <input type={type} className="control" {...input} {...controlProps(id, said)} />
    </Field>
  );
}
