import type { FormState } from '@/lib/server/define-action';
import { keepAt, leadFrom } from '@/lib/server/lead-on';

type Ways = {
  readonly keep: (state: FormState) => Promise<string>;
  readonly lead: (refusal: { readonly kind: string }, state: FormState) => Promise<string | null>;
};

/** Where a refused form is shown again whose page is about one record: by the id in the form, which anybody may have written. */
export function atPage(pageOf: (id: string) => string): Ways {
  const page = ({ values }: FormState): string => pageOf(encodeURIComponent(String(values['id'] ?? '')));
  return {
    keep: (state) => keepAt(page(state))(state),
    lead: (refusal, state) => leadFrom(page(state))(refusal, state),
  };
}
