import type { ReactElement } from 'react';
import type { AccountRole } from '@/lib/access/domain/actor';
import { POLICY } from '@/lib/access/domain/policy';
import { words } from '@/lib/kernel/words';
import { MenuLink } from './menu-link';

/** Whoever is signed in, as far as the menu shows it. */
export type Who = { readonly name: string; readonly role: AccountRole };

type Props = {
  readonly path: string;
  readonly who: Who | null;
  readonly signOut: (form: FormData) => Promise<void>;
};

/** "Sign in", or who one is with the ways to the bench and out. */
export function AccountMenu({ path, who, signOut }: Props): ReactElement {
  return (
    <nav aria-label={words('bench.menu.label')} className="not-in-print">
      <ul className="site-account" role="list">
        {who === null ? (
          <MenuLink href="/sign-in" path={path}>
            {words('bench.menu.signIn')}
          </MenuLink>
        ) : (
          <>
            <li className="account-who">{who.name}</li>
            <MenuLink href="/bench" path={path}>
              {words('bench.menu.bench')}
            </MenuLink>
            {POLICY['amendment.judge'].includes(who.role) ? (
              <MenuLink href="/sorting-table" path={path}>
                {words('review.link')}
              </MenuLink>
            ) : null}
            <li>
              <form action={signOut}>
                <button type="submit">{words('bench.menu.signOut')}</button>
              </form>
            </li>
          </>
        )}
      </ul>
    </nav>
  );
}
