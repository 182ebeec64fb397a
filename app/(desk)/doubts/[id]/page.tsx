import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm } from '@/components/accounts/entry-form';
import { Press } from '@/components/accounts/press';
import { aboutWords } from '@/components/doubts/doubt-table';
import { saidName } from '@/components/doubts/said-name';
import { DefinitionList } from '@/components/ui/definition-list';
import { PageHeading } from '@/components/ui/page-heading';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { doubtId } from '@/lib/regions/doubt-schema';
import { readDoubt, type ToldDoubt } from '@/lib/regions/list-doubts';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { enter } from '@/lib/server/lead-on';
import { answer, setAside, takeUp } from '../actions';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('doubts.desk.title'), robots: { index: false } };

export default async function DoubtPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { id } = await params;
  const { ctx } = await enter('doubt.answer', `/doubts/${encodeURIComponent(id)}`);
  const parsed = doubtId.safeParse(id);
  const found = parsed.success ? await readDoubt(ctx, parsed.data) : null;
  if (found?.ok !== true) notFound();
  const doubt = found.value;
  const kept = await findKept(one(await searchParams, 'look'));
  return (
    <div className="max-w-text">
      <PageHeading>{words('doubts.one.title', { rule: aboutWords(doubt) })}</PageHeading>
      <p className="mt-4">{words('doubts.one.sent', { date: sayDate(calendarDateOf(doubt.madeAt)), place: doubt.place })}</p>
      <div className="mt-6">
        <Written doubt={doubt} />
      </div>
      <RuleLinks doubt={doubt} />
      {doubt.state === 'waiting' ? <Waiting id={doubt.id} kept={kept} /> : <Over doubt={doubt} kept={kept} />}
      <p className="mt-8">
        <a href="/doubts">{words('doubts.one.back')}</a>
      </p>
    </div>
  );
}

const asText = (text: string): ReactElement => <span className="whitespace-pre-line break-words">{text}</span>;

/** All of it as plain text: an address is no link. */
function Written({ doubt: { words: written, elsewhere, link } }: { readonly doubt: ToldDoubt }): ReactElement {
  return (
    <>
      <DefinitionList
        entries={[
          { id: 'words', name: words('doubts.one.words'), value: asText(written) },
          ...(elsewhere === null ? [] : [{ id: 'elsewhere', name: words('doubts.one.elsewhere'), value: asText(elsewhere) }]),
          ...(link === null ? [] : [{ id: 'link', name: words('doubts.one.address'), value: asText(link) }]),
        ]}
      />
      {link === null ? null : <p className="mt-3 text-umber">{words('doubts.one.notLink')}</p>}
    </>
  );
}

function RuleLinks({ doubt: { rule, region } }: { readonly doubt: ToldDoubt }): ReactElement | null {
  if (rule === null) return null;
  return (
    <ul className="mt-4" role="list">
      <li>
        <a className="inline-block py-2" href={`/rules/${rule}`}>
          {words('doubts.one.rule')}
        </a>
      </li>
      <li>
        <a className="inline-block py-2" href={`/regions/${region}/amend?item=rules/${rule}`}>
          {words('doubts.one.amend')}
        </a>
      </li>
    </ul>
  );
}

type FormsProps = { readonly id: string; readonly kept: FormState | null };

/** Two forms on one page: what was kept goes back into the one it came from, which its field tells. */
function Waiting({ id, kept }: FormsProps): ReactElement {
  const isAside = kept !== null && 'reason' in kept.values;
  return (
    <>
      <section className="mt-8" aria-labelledby="answer-title">
        <h2 id="answer-title">{words('doubts.one.answer')}</h2>
        <p className="mt-2 mb-4">{words('doubts.one.answerLead')}</p>
        <EntryForm
          action={answer}
          first={kept !== null && !isAside ? kept : freshForm()}
          {...formWords()}
          label={words('doubts.one.answer')}
          hidden={{ id }}
          submit={words('doubts.one.send')}
          fields={[{ name: 'answer', type: 'long-text', label: words('doubts.one.answer'), hint: words('doubts.one.answerHint') }]}
        />
      </section>
      <section className="mt-12" aria-labelledby="aside-title">
        <h2 id="aside-title">{words('doubts.one.aside')}</h2>
        <p className="mt-2 mb-4">{words('doubts.one.asideLead')}</p>
        <EntryForm
          action={setAside}
          first={isAside ? kept : freshForm()}
          {...formWords()}
          label={words('doubts.one.aside')}
          hidden={{ id }}
          submit={words('doubts.one.put')}
          fields={[{ name: 'reason', type: 'text', label: words('doubts.one.reason'), hint: words('doubts.one.reasonHint') }]}
        />
      </section>
    </>
  );
}

/** Why a form was refused, and what was typed in it. */
function TooLate({ kept: { values, errors } }: { readonly kept: FormState }): ReactElement {
  const typed = values['answer'] ?? values['reason'];
  return (
    <>
      <p className="field-error mt-6" role="alert">
        {Object.values(errors).join('. ')}
      </p>
      {typeof typed === 'string' ? <p className="mt-2">{asText(typed)}</p> : null}
    </>
  );
}

/** How it was ended, below what somebody typed who came too late. */
function Over({ doubt, kept }: { readonly doubt: ToldDoubt; readonly kept: FormState | null }): ReactElement {
  const who = saidName(doubt.by ?? { kind: 'former-editor' });
  const date = sayDate(calendarDateOf(doubt.answeredAt ?? doubt.madeAt));
  return (
    <>
      {kept === null ? null : <TooLate kept={kept} />}
      {doubt.answer === null ? null : (
        <div className="mt-6">
          <h2>{words('doubts.one.answer')}</h2>
          <p className="mt-2">{asText(doubt.answer)}</p>
          <p className="mt-2 text-umber">{words('doubts.one.answered', { who, date })}</p>
        </div>
      )}
      {doubt.asideWhy === null ? null : (
        <div className="mt-6">
          <p className="mb-4 break-words">{words('doubts.one.asideBy', { who, date, why: doubt.asideWhy })}</p>
          <Press
            action={takeUp}
            first={freshForm()}
            hidden={{ id: doubt.id }}
            submit={words('doubts.desk.undo')}
            busy={formWords().busy}
            kind="plain"
          />
        </div>
      )}
    </>
  );
}
