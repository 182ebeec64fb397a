import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm } from '@/components/accounts/entry-form';
import { BecomesTrue, Where } from '@/components/review/becomes-true';
import { ReviewFrame } from '@/components/review/review-frame';
import { words } from '@/lib/kernel/words';
import { readWithdrawal, type Withdrawal } from '@/lib/regions/read-withdrawal';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { findSheet } from '../../find-sheet';
import { withdraw } from './actions';

type Props = { readonly params: Promise<{ readonly code: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('review.withdraw.heading'), robots: { index: false } };

export default async function WithdrawPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { code } = await params;
  const { ctx } = await enter('edition.withdraw', `/regions/${encodeURIComponent(code)}/editions/withdraw`);
  const sheet = await findSheet(code);
  const found = sheet === null ? null : await readWithdrawal(ctx, { region: sheet.code });
  if (sheet === null || found?.ok !== true) notFound();
  const { number, back } = found.value;
  const kept = await findKept(one(await searchParams, 'look'));
  return (
    <ReviewFrame
      title={words('review.withdraw.title', { number, name: sheet.name })}
      back={{ href: `/regions/${sheet.code}/editions`, text: words('editions.back', { name: sheet.name }) }}
    >
      {back === null ? (
        <p className="mt-4 max-w-text">{words('review.withdraw.first')}</p>
      ) : (
        <WithdrawForm region={sheet.code} number={number} back={back} first={kept ?? freshForm()} />
      )}
    </ReviewFrame>
  );
}

type FormProps = {
  readonly region: string;
  readonly number: number;
  readonly back: NonNullable<Withdrawal['back']>;
  readonly first: FormState;
};

/** What goes, what comes back, where; then the reason. */
function WithdrawForm({ region, number, back, first }: FormProps): ReactElement {
  const { comparison } = back;
  const next = number + 1;
  const [older, newer] = [String(back.number), String(number)];
  return (
    <div className="max-w-text">
      <p className="mt-4">{words('review.withdraw.lead', { number, back: back.number, next })}</p>
      <h2 className="mt-8">{words('review.withdraw.was', { number })}</h2>
      <p className="mt-2 whitespace-pre-line wrap-anywhere">{comparison.from.summary}</p>
      <p className="mt-2">
        <a href={`/regions/${region}/editions/compare?from=${older}&to=${newer}`}>{words('review.withdraw.compare')}</a>
      </p>
      <h2 className="mt-8">{words('review.withdraw.comes')}</h2>
      <div className="mt-3">
        <BecomesTrue compared={comparison} />
      </div>
      <h2 className="mt-8">{words('review.becomes.where')}</h2>
      <div className="mt-2 mb-8">
        <Where compared={comparison} />
      </div>
      <EntryForm
        action={withdraw}
        first={first}
        {...formWords()}
        hidden={{ region, number: String(number) }}
        submit={words('review.withdraw.submit')}
        fields={[{ name: 'reason', type: 'long-text', label: words('review.withdraw.reason'), hint: words('review.withdraw.hint') }]}
      />
    </div>
  );
}
