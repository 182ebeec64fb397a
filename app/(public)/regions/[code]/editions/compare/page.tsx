import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { CompareForm } from '@/components/regions/compare-form';
import { EditionsComparison } from '@/components/regions/editions-comparison';
import { PageHeading } from '@/components/ui/page-heading';
import { Panel } from '@/components/ui/panel';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { compareEditions } from '@/lib/regions/compare-editions';
import { listEditions, type ListedEdition } from '@/lib/regions/list-editions';
import { makeCtx } from '@/lib/server/ctx';
import { findSheet } from '../../find-sheet';

type Asked = Readonly<Record<string, string | readonly string[] | undefined>>;
type Props = { readonly params: Promise<{ readonly code: string }>; readonly searchParams: Promise<Asked> };
type Choice = { readonly from: number; readonly to: number };

const NUMBER = /^[1-9]\d{0,8}$/;
const numberIn = (value: Asked[string]): number | null => (typeof value === 'string' && NUMBER.test(value) ? Number(value) : null);

/** The two editions asked for, the earlier one first; the last two where none is asked for. Null where they cannot be compared. */
function choiceOf({ from, to }: Asked, editions: readonly ListedEdition[]): Choice | null {
  const asked = [numberIn(from), numberIn(to)].flatMap((number) => number ?? []).sort((a, b) => a - b);
  const last = editions.slice(-2).map(({ number }) => number);
  const [first, second] = from === undefined && to === undefined ? last : asked;
  return first === undefined || second === undefined || first === second ? null : { from: first, to: second };
}

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const sheet = await findSheet((await params).code);
  if (sheet === null) return {};
  const { name } = sheet;
  return { title: words('editions.titleNone', { name }), description: words('editions.description', { name }), robots: { index: false } };
}

export default async function CompareEditionsPage({ params, searchParams }: Props): Promise<ReactElement> {
  const [sheet, asked] = [await findSheet((await params).code), await searchParams];
  if (sheet === null) notFound();
  const { code, name } = sheet;
  const editions = await listEditions(makeCtx(), code);
  if (!editions.ok) notFound();
  const choice = choiceOf(asked, editions.value);
  return (
    <>
      <PageHeading>{choice === null ? words('editions.titleNone', { name }) : words('editions.title', { name, ...choice })}</PageHeading>
      <Body code={code} name={name} editions={editions.value} choice={choice} />
      <p className="mt-8">
        <a href={`/regions/${code}/editions`}>{words('editions.back', { name })}</a>
      </p>
    </>
  );
}

type BodyProps = ComparedProps & { readonly editions: readonly ListedEdition[] };

function Body({ code, name, editions, choice }: BodyProps): ReactElement {
  const [only] = editions;
  if (editions.length === 1 && only !== undefined) return <OnlyOne code={code} name={name} number={only.number} />;
  return (
    <>
      <CompareForm code={code} editions={editions} from={choice?.from ?? null} to={choice?.to ?? null} />
      <Compared code={code} name={name} choice={choice} />
    </>
  );
}

type ComparedProps = { readonly code: string; readonly name: string; readonly choice: Choice | null };

async function Compared({ code, name, choice }: ComparedProps): Promise<ReactElement> {
  const compared = choice === null ? null : await compareEditions(makeCtx(), { code, ...choice });
  if (compared?.ok !== true) {
    return (
      <div className="mt-6">
        <Panel colour="ash">
          <h2>{words('editions.badChoice.title')}</h2>
          <p className="mt-2">{words('editions.badChoice.meaning', { name })}</p>
        </Panel>
      </div>
    );
  }
  return (
    <>
      <p className="mt-6 max-w-text">{words('editions.lead', { date: sayDate(compared.value.on) })}</p>
      <EditionsComparison compared={compared.value} />
    </>
  );
}

/** What will stand here, while there is nothing to compare. */
function OnlyOne({ code, name, number }: { readonly code: string; readonly name: string; readonly number: number }): ReactElement {
  return (
    <div className="mt-6">
      <Panel>
        <h2>{words('editions.only.title')}</h2>
        <p className="mt-2 max-w-text">{words('editions.only.meaning', { name, number })}</p>
        <p className="mt-2">
          <a href={`/regions/${code}/editions/${String(number)}`}>{words('editions.only.read', { number })}</a>
        </p>
      </Panel>
    </div>
  );
}
