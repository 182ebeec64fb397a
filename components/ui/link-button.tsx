import type { ComponentProps, ReactElement } from 'react';

type Props = Omit<ComponentProps<'a'>, 'className'> & { readonly href: string; readonly kind?: 'primary' | 'plain' };

/** A link that begins something and so looks like a button. It stays a link. */
export function LinkButton({ kind = 'primary', children, ...rest }: Props): ReactElement {
  return (
    <a className={`button button-${kind}`} {...rest}>
      {children}
    </a>
  );
}
