import type { ReactElement } from 'react';
import { SiteSearch } from '@/components/search/site-search';
import { words } from '@/lib/kernel/words';
import { AccountMenu, type Who } from './account-menu';
import { FootRingMark } from './foot-ring-mark';
import { MenuLink } from './menu-link';

type Props = {
  readonly path: string;
  /** Whoever is signed in. */
  readonly who: Who | null;
  readonly signOut: (form: FormData) => Promise<void>;
};

/** Name, menu, the way to a person, and one's own account: the same on every page, in the same order. */
export function SiteHeader({ path, who, signOut }: Props): ReactElement {
  return (
    <header className="site-head">
      <div className="page site-bar">
        <a className="site-name" href="/" aria-label={words('site.menu.home')}>
          <FootRingMark size={40} />
          <span>{words('site.name')}</span>
        </a>
        <nav aria-label={words('site.menu.label')}>
          <ul className="site-menu" role="list">
            <MenuLink href="/check" path={path}>
              {words('site.menu.check')}
            </MenuLink>
            <MenuLink href="/regions" path={path}>
              {words('site.menu.regions')}
            </MenuLink>
            <MenuLink href="/readings" path={path}>
              {words('site.menu.readings')}
            </MenuLink>
            <MenuLink href="/notes" path={path}>
              {words('site.menu.notes')}
            </MenuLink>
            <MenuLink href="/contact" path={path}>
              {words('site.menu.help')}
            </MenuLink>
          </ul>
        </nav>
        <SiteSearch />
        <AccountMenu path={path} who={who} signOut={signOut} />
      </div>
      <div className="page">
        <div className="site-line not-in-print" />
      </div>
    </header>
  );
}
