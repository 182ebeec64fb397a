import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { findRuleInUse } from '../../find-rule';

type Props = { readonly params: Promise<{ readonly id: string }> };

export const metadata: Metadata = { title: words('doubts.sent.title'), robots: { index: false } };

export default async function DoubtSentPage({ params }: Props): Promise<ReactElement> {
  const found = await findRuleInUse((await params).id);
  if (found === null) notFound();
  const { rule, sheet } = found;
  return (
    <div className="max-w-text">
      <PageHeading>{words('doubts.sent.title')}</PageHeading>
      <p className="mt-4" role="status">
        {words('doubts.sent.lead', { place: sheet.name })}
      </p>
      <h2 className="mt-8">{words('doubts.raise.next')}</h2>
      <ul className="mt-3 list-disc ps-6">
        {(['nextRead', 'nextAnswer', 'nextNobody'] as const).map((part) => (
          <li key={part}>{words(`doubts.raise.${part}`)}</li>
        ))}
        <li>{words('doubts.sent.meanwhile')}</li>
      </ul>
      <p className="mt-8">
        {words('doubts.sent.rule')}: <a href={`/rules/${rule.id}`}>{rule.title}</a>
      </p>
      <p className="mt-3">
        <a href={`/regions/${sheet.code}`}>{sheet.name}</a>
      </p>
    </div>
  );
}
