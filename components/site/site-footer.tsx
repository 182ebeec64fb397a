import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import { MenuLink } from './menu-link';
import { ThemeChoice, type Theme } from './theme-choice';

type Props = { readonly path: string; readonly theme: Theme; readonly chooseTheme: (form: FormData) => Promise<void> };

const LICENCE = 'https://creativecommons.org/licenses/by-sa/4.0/';

/** The caution in short, the still pages, the choice of colours. */
export function SiteFooter({ path, theme, chooseTheme }: Props): ReactElement {
  return (
    <footer className="site-foot">
      <div className="page">
        <div className="foot-caution">
          <p>{words.rich('site.foot.caution', { strong: (said) => <strong className="font-strong">{said}</strong> })}</p>
          <p className="not-in-print mt-3 text-umber">
            {words.rich('site.foot.licence', { licence: (said) => <a href={LICENCE}>{said}</a> })}
          </p>
        </div>
        <div className="flex flex-col gap-4">
          <nav aria-label={words('site.foot.label')}>
            <ul className="foot-links" role="list">
              {(['privacy', 'cautions', 'accessibility', 'contact'] as const).map((page) => (
                <MenuLink key={page} href={`/${page}`} path={path}>
                  {words(`site.foot.${page}`)}
                </MenuLink>
              ))}
              <MenuLink href="/day-book" path={path}>
                {words('day-book.title')}
              </MenuLink>
            </ul>
          </nav>
          <ThemeChoice theme={theme} choose={chooseTheme} />
        </div>
      </div>
    </footer>
  );
}
