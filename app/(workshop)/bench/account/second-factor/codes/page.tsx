import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { AccountFrame } from '@/components/accounts/account-frame';
import { LinkButton } from '@/components/ui/link-button';
import { words } from '@/lib/kernel/words';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';

type Props = { readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('bench.second.codes.title'), robots: { index: false } };

export default async function CodesPage({ searchParams }: Props): Promise<ReactElement> {
  await enter('account.read-own', '/bench/account/second-factor');
  const kept = await findKept(one(await searchParams, 'look'));
  const codes = [kept?.values['codes'] ?? []].flat();
  return (
    <AccountFrame title={words('bench.second.codes.title')} takesFocus>
      {codes.length === 0 ? <p className="mt-4">{words('bench.second.codes.over')}</p> : <Codes codes={codes} />}
    </AccountFrame>
  );
}

function Codes({ codes }: { readonly codes: readonly string[] }): ReactElement {
  return (
    <>
      <p className="mt-4">{words('bench.second.codes.lead')}</p>
      <p className="mt-3">{words('bench.second.codes.once')}</p>
      <ul className="code-list my-6" role="list" aria-label={words('bench.second.codes.list')}>
        {codes.map((code) => (
          <li key={code} className="py-1">
            {code}
          </li>
        ))}
      </ul>
      <LinkButton href="/bench">{words('bench.second.codes.go')}</LinkButton>
    </>
  );
}
