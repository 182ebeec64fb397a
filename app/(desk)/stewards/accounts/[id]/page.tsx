import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { one, type Query } from '@/app/(account)/form-words';
import { LineTable } from '@/components/day-book/line-table';
import { AccountFacts } from '@/components/stewards/account-facts';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { RequestList } from '@/components/stewards/request-list';
import { tellLine } from '@/lib/day-book/domain/told-line';
import { words } from '@/lib/kernel/words';
import { findAccount } from '../../find-account';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('stewards.title'), robots: { index: false } };

const DONE = ['role', 'closed', 'opened'] as const;

export default async function AccountPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { account, isOwn, sessions, requests, lines } = await findAccount(
    (await params).id,
    'account.look-up',
    (id) => `/stewards/accounts/${id}`,
  );
  const said = one(await searchParams, 'done');
  const done = DONE.find((name) => name === said);
  const people = new Map([[account.id, account]]);
  const needsFactor = (account.role === 'moderator' || account.role === 'steward') && account.secondFactorOnAt === null;
  return (
    <DeskFrame
      title={words('stewards.account.title', { name: account.name })}
      path="/stewards"
      done={done === undefined ? undefined : words(`stewards.done.${done}`)}
    >
      {isOwn ? <p className="mt-4">{words('stewards.account.you')}</p> : null}
      <div className="mt-6 max-w-text">
        <AccountFacts account={account} sessions={sessions} />
      </div>
      {needsFactor ? <p className="mt-4 max-w-text">{words('stewards.account.factorMissing')}</p> : null}
      <RequestList requests={requests} />
      <h2 className="mt-12">{words('stewards.account.lines')}</h2>
      <div className="mt-4">
        {lines.length === 0 ? (
          <p>{words('stewards.account.noLines')}</p>
        ) : (
          <LineTable lines={lines.map((line) => tellLine(line, people))} places={[]} />
        )}
      </div>
    </DeskFrame>
  );
}
