import { remarksAnchor } from '@/components/review/anchors';
import type { FormState } from '@/lib/server/define-action';
import { keepForm } from '@/lib/server/kept-form';
import { leadFrom } from '@/lib/server/lead-on';
import { pageOf } from './find-review';

type Ways = {
  readonly keep: (state: FormState) => Promise<string>;
  readonly lead: (refusal: { readonly kind: string }, state: FormState) => Promise<string | null>;
};

/** A field that is text; whoever calls an action by hand may send anything. */
export function textIn(form: FormData, name: string): string {
  const value = form.get(name);
  return typeof value === 'string' ? value : '';
}

const valueIn = ({ values }: FormState, name: string): string => String(values[name] ?? '');

/** Where a refused form is shown again: at the page of its amendment and, where it is about one line, at that line. */
export function atPage(page = ''): Ways {
  const here = (state: FormState): string => pageOf(valueIn(state, 'id'), page);
  return {
    keep: async (state) => {
      const line = valueIn(state, 'line');
      return `${here(state)}?${await keepForm(state)}${line === '' ? '' : `#${remarksAnchor(line)}`}`;
    },
    lead: (refusal, state) => leadFrom(here(state))(refusal, state),
  };
}
