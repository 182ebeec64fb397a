import type { ComponentProps, ReactElement } from 'react';

type Props = Omit<ComponentProps<'button'>, 'className' | 'disabled'> & { readonly kind?: 'primary' | 'plain' };

/** Says the act it does. Never disabled: pressed, it explains. */
export function Button({ kind = 'primary', type = 'submit', ...rest }: Props): ReactElement {
  return <button type={type} className={`button button-${kind}`} {...rest} />;
}
