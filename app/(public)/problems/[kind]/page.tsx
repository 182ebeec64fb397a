import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { DefinitionList } from '@/components/ui/definition-list';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { PROBLEMS, type ProblemKind } from '@/lib/server/problem';

type Props = { readonly params: Promise<{ readonly kind: string }> };

const isProblem = (kind: string): kind is ProblemKind => Object.hasOwn(PROBLEMS, kind);

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { kind } = await params;
  return isProblem(kind) ? { title: words(`problems.${kind}.title`), description: words('regions.problem.description') } : {};
}

export default async function ProblemPage({ params }: Props): Promise<ReactElement> {
  const { kind } = await params;
  if (!isProblem(kind)) notFound();
  return (
    <div className="max-w-text">
      <PageHeading>{words(`problems.${kind}.title`)}</PageHeading>
      <p className="mt-4">{words('regions.problem.lead')}</p>
      <div className="mt-6">
        <DefinitionList
          entries={[
            { id: 'status', name: words('regions.problem.status'), value: String(PROBLEMS[kind]) },
            { id: 'kind', name: words('regions.problem.kind'), value: <code>{`/problems/${kind}`}</code> },
            {
              id: 'mend',
              name: words('regions.problem.mend'),
              value: kind === 'broken' ? words('regions.problem.broken') : words(`problems.${kind}.detail`),
            },
          ]}
        />
      </div>
      <ul className="mt-6 font-sans text-plain">
        <li>
          <a className="inline-block py-2" href="/regions">
            {words('regions.problem.regions')}
          </a>
        </li>
        <li>
          <a className="inline-block py-2" href="/contact">
            {words('regions.problem.help')}
          </a>
        </li>
      </ul>
    </div>
  );
}
