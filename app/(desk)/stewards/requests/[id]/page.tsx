import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm } from '@/components/accounts/entry-form';
import { DeskFrame } from '@/components/stewards/desk-frame';
import { DefinitionList } from '@/components/ui/definition-list';
import { readRequest, type AskedRequest } from '@/lib/accounts/list-requests';
import { requestId } from '@/lib/accounts/steward-schema';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { placeWords } from '@/lib/regions/domain/condition-words';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { answer } from '../../actions';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('stewards.requests.title'), robots: { index: false } };

const day = (at: Date): string => sayDate(calendarDateOf(at));

export default async function RequestPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { id } = await params;
  const { ctx } = await enter('role.answer', `/stewards/requests/${encodeURIComponent(id)}`);
  const parsed = requestId.safeParse(id);
  const found = parsed.success ? await readRequest(ctx, parsed.data) : null;
  if (found?.ok !== true) notFound();
  const request = found.value;
  const { state, answeredAt, name } = request;
  return (
    <DeskFrame title={words('stewards.request.title', { name })} path="/stewards/requests/">
      <div className="mt-4 max-w-text">
        <Asked request={request} />
        {state === 'waiting' ? (
          <AnswerForm id={request.id} first={(await findKept(one(await searchParams, 'look'))) ?? freshForm()} />
        ) : (
          <p className="mt-6">{words('stewards.request.ended', { state, on: day(answeredAt ?? request.madeAt) })}</p>
        )}
        <p className="mt-8">
          <a href="/stewards/requests">{words('stewards.request.back')}</a>
        </p>
      </div>
    </DeskFrame>
  );
}

function Asked({ request: { accountId, why, regions, madeAt } }: { readonly request: AskedRequest }): ReactElement {
  return (
    <>
      <p>
        {words('stewards.request.asked', { on: day(madeAt) })}{' '}
        <a href={`/stewards/accounts/${accountId}`}>{words('stewards.request.account')}</a>
      </p>
      <div className="mt-4">
        <DefinitionList
          entries={[
            { id: 'why', name: words('stewards.request.why'), value: <span className="whitespace-pre-line break-words">{why}</span> },
            {
              id: 'places',
              name: words('stewards.requests.places'),
              value: regions.length === 0 ? words('stewards.requests.noPlaces') : regions.map(placeWords).join(', '),
            },
          ]}
        />
      </div>
    </>
  );
}

function AnswerForm({ id, first }: { readonly id: string; readonly first: FormState }): ReactElement {
  return (
    <div className="mt-8">
      <EntryForm
        action={answer}
        first={first}
        {...formWords()}
        hidden={{ id }}
        submit={words('stewards.request.submit')}
        fields={[
          {
            name: 'answer',
            type: 'choice',
            label: words('stewards.request.answer'),
            none: words('stewards.fault.answer.none'),
            options: (['granted', 'refused'] as const).map((value) => ({ value, label: words(`stewards.request.${value}`) })),
          },
          { name: 'said', type: 'long-text', label: words('stewards.request.said'), hint: words('stewards.request.saidHint') },
        ]}
      />
    </div>
  );
}
