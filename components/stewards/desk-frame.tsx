import type { ReactElement, ReactNode } from 'react';
import { Note } from '@/components/accounts/note';
import { MenuLink } from '@/components/site/menu-link';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';

const PAGES = [
  ['accounts', '/stewards'],
  ['requests', '/stewards/requests'],
  ['outbox', '/stewards/outbox'],
  ['health', '/stewards/health'],
  ['dayBook', '/day-book'],
] as const;

type Props = {
  readonly title: ReactNode;
  /** The address of the page in the desk's menu that it is or belongs to. */
  readonly path: string;
  /** What was just done. */
  readonly done?: string | undefined;
  readonly children: ReactNode;
};

/** A page of the stewards' desk: its menu, its heading, and what was just done. */
export function DeskFrame({ title, path, done, children }: Props): ReactElement {
  return (
    <>
      <nav aria-label={words('stewards.menu.label')} className="not-in-print mb-6">
        <ul className="site-menu" role="list">
          {PAGES.map(([page, href]) => (
            <MenuLink key={page} href={href} path={href === '/stewards' && path !== '/stewards' ? '' : path}>
              {words(`stewards.menu.${page}`)}
            </MenuLink>
          ))}
        </ul>
      </nav>
      {done === undefined ? null : <Note>{done}</Note>}
      <PageHeading>{title}</PageHeading>
      {children}
    </>
  );
}
