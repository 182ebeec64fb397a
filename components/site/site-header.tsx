import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import { FootRingMark } from './foot-ring-mark';
import { MenuLink } from './menu-link';

/** Name, menu, and the way to a person: the same on every page, in the same order. */
export function SiteHeader({ path }: { readonly path: string }): ReactElement {
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
            <MenuLink href="/contact" path={path}>
              {words('site.menu.help')}
            </MenuLink>
          </ul>
        </nav>
      </div>
      <div className="page">
        <div className="site-line not-in-print" />
      </div>
    </header>
  );
}
