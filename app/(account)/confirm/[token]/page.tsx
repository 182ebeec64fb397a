import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { readMailedLink } from '@/lib/accounts/read-mailed-link';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';
import { confirm } from '../../actions';
import { LinkOver } from '../../link-over';
import { OnePress } from '../../one-press';

type Props = { readonly params: Promise<{ readonly token: string }> };

export const metadata: Metadata = { title: words('accounts.confirm.account.title'), robots: { index: false } };

export default async function ConfirmPage({ params }: Props): Promise<ReactElement> {
  const { token } = await params;
  const kind = await readMailedLink(makeCtx(), token, ['confirm', 'address']);
  if (kind === null) return <LinkOver />;
  const what = kind === 'address' ? 'address' : 'account';
  return (
    <OnePress
      title={words(`accounts.confirm.${what}.title`)}
      lead={words(`accounts.confirm.${what}.lead`)}
      submit={words(`accounts.confirm.${what}.submit`)}
      token={token}
      act={confirm}
    />
  );
}
