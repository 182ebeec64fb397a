import type { ReactElement, ReactNode } from 'react';

type Props = { readonly href: string; readonly path: string; readonly children: ReactNode };

/** "page" for this very page, "true" for the part of the site it belongs to. */
function currentOf(href: string, path: string): 'page' | 'true' | undefined {
  if (href === path) return 'page';
  return path.startsWith(`${href}/`) ? 'true' : undefined;
}

/** A line of the menu; the one that leads to where one is says so. */
export function MenuLink({ href, path, children }: Props): ReactElement {
  return (
    <li>
      <a href={href} aria-current={currentOf(href, path)}>
        {children}
      </a>
    </li>
  );
}
