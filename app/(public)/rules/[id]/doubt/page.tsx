import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm } from '@/components/accounts/entry-form';
import { TrapField } from '@/components/doubts/trap-field';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { makeStamp, stampAge } from '@/lib/server/form-stamp';
import { findKept } from '@/lib/server/kept-form';
import { findRuleInUse } from '../find-rule';
import { raise } from './actions';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const found = await findRuleInUse((await params).id);
  if (found === null) return {};
  const description = words('doubts.raise.description', { place: found.sheet.name });
  return { title: words('doubts.raise.titleOf', { title: found.rule.title }), description, robots: { index: false } };
}

export default async function RaiseDoubtPage({ params, searchParams }: Props): Promise<ReactElement> {
  const found = await findRuleInUse((await params).id);
  if (found === null) notFound();
  const { rule } = found;
  const kept = await findKept(one(await searchParams, 'look'));
  return (
    <div className="max-w-text">
      <PageHeading>{words('doubts.raise.titleOf', { title: rule.title })}</PageHeading>
      <p className="mt-4">{words('doubts.raise.lead')}</p>
      <div className="mt-6">
        <Panel label={words('doubts.raise.rule')}>
          <p className="font-strong">{words('doubts.raise.rule')}</p>
          <p className="mt-2">{rule.says}</p>
        </Panel>
      </div>
      <div className="mt-8">
        <EntryForm
          action={raise}
          first={kept ?? freshForm()}
          {...formWords()}
          label={words('doubts.raise.title')}
          hidden={{ rule: rule.id, stamp: stampOf(rule.id, kept) }}
          submit={words('doubts.raise.submit')}
          fields={[
            { name: 'words', type: 'long-text', label: words('doubts.raise.words'), hint: words('doubts.raise.wordsHint') },
            { name: 'elsewhere', type: 'text', label: words('doubts.raise.elsewhere'), hint: words('doubts.raise.elsewhereHint') },
            { name: 'link', type: 'text', label: words('doubts.raise.address'), hint: words('doubts.raise.addressHint') },
          ]}
        >
          <TrapField />
        </EntryForm>
      </div>
      <WhatNext />
      <p className="mt-8">
        <a href={`/rules/${rule.id}`}>{words('doubts.raise.back')}</a>
      </p>
    </div>
  );
}

const HOUR_MS = 60 * 60_000;

/** The stamp of a form that comes back stays, so that its second try is not too quick again; an old one is written anew. */
function stampOf(rule: string, kept: FormState | null): string {
  const now = new Date();
  const stamp = kept?.values['stamp'];
  const age = typeof stamp === 'string' ? stampAge(rule, stamp, now) : null;
  return typeof stamp === 'string' && age !== null && age >= 0 && age < HOUR_MS ? stamp : makeStamp(rule, now);
}

function WhatNext(): ReactElement {
  return (
    <section className="mt-12" aria-labelledby="next">
      <h2 id="next">{words('doubts.raise.next')}</h2>
      <ul className="mt-3 list-disc ps-6">
        {(['nextRead', 'nextAnswer', 'nextAside', 'nextNobody'] as const).map((part) => (
          <li key={part}>{words(`doubts.raise.${part}`)}</li>
        ))}
      </ul>
    </section>
  );
}
