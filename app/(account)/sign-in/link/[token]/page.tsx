import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { readMailedLink } from '@/lib/accounts/read-mailed-link';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';
import { enterByLink } from '../../../actions';
import { LinkOver } from '../../../link-over';
import { OnePress } from '../../../one-press';

type Props = { readonly params: Promise<{ readonly token: string }> };

export const metadata: Metadata = { title: words('accounts.signIn.link.title'), robots: { index: false } };

export default async function SignInLinkPage({ params }: Props): Promise<ReactElement> {
  const { token } = await params;
  if ((await readMailedLink(makeCtx(), token, ['link'])) === null) return <LinkOver />;
  return (
    <OnePress
      title={words('accounts.signIn.link.title')}
      lead={words('accounts.signIn.link.lead')}
      submit={words('accounts.signIn.link.submit')}
      token={token}
      act={enterByLink}
    />
  );
}
