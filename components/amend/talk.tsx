import type { ReactElement } from 'react';
import type { EntryState } from '@/components/accounts/entry-form';
import { RemarkForm } from '@/components/review/remark-form';
import { sayInstant } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { OwnAmendment, Remark } from '@/lib/regions/domain/amendment-view';

type DecisionsProps = { readonly decisions: OwnAmendment['decisions'] };

/** What moderators decided, the last first. */
export function Decisions({ decisions }: DecisionsProps): ReactElement | null {
  if (decisions.length === 0) return null;
  return (
    <section className="amend-section max-w-text" aria-labelledby="decisions">
      <h2 id="decisions">{words('amend.talk.decisions')}</h2>
      <ul className="mt-3" role="list">
        {decisions.toReversed().map(({ kind, by, at, reason }) => (
          <li key={at.toISOString()} className="border-b border-rule py-3">
            <p className="font-strong">{words(`amend.decided.${kind}`, { by })}</p>
            {reason === null || reason === '' ? null : <p>{reason}</p>}
            <p className="font-sans text-plain text-umber">{sayInstant(at)}</p>
          </li>
        ))}
      </ul>
    </section>
  );
}

type Props = {
  readonly remarks: readonly Remark[];
  readonly id: string;
  readonly answer: (prev: EntryState, form: FormData) => Promise<EntryState>;
  readonly first: (remark: string) => EntryState;
  readonly titleOf: (line: string) => string;
  readonly busy: string;
};

/** Remarks of moderators, each tied to a line, with a field to answer. Open ones first. */
export function Remarks({ remarks, id, answer, first, titleOf, busy }: Props): ReactElement | null {
  if (remarks.length === 0) return null;
  const sorted = [...remarks.filter(({ isAnswered }) => !isAnswered), ...remarks.filter(({ isAnswered }) => isAnswered)];
  return (
    <section className="amend-section max-w-text" aria-labelledby="remarks">
      <h2 id="remarks">{words('amend.talk.remarks')}</h2>
      {sorted.map((remark) => (
        <article key={remark.id} className="mt-4 border-b border-rule pb-4" aria-label={titleOf(remark.line)}>
          <h3>{titleOf(remark.line)}</h3>
          <Said by={remark.by} at={remark.at} text={remark.words} />
          {remark.answers.map((one) => (
            <div key={one.id} className="ms-6 mt-2">
              <Said by={one.by} at={one.at} text={one.words} />
            </div>
          ))}
          {remark.isAnswered ? (
            <p className="mt-2 font-sans text-plain text-umber">{words('amend.talk.done')}</p>
          ) : (
            <div className="mt-3">
              <RemarkForm
                action={answer}
                first={first(remark.id)}
                hidden={{ id, remark: remark.id }}
                label={words('amend.talk.answer')}
                hint={words('amend.talk.answerHint')}
                submit={words('amend.talk.send')}
                busy={busy}
              />
            </div>
          )}
        </article>
      ))}
    </section>
  );
}

function Said({ by, at, text }: { readonly by: string; readonly at: Date; readonly text: string }): ReactElement {
  return (
    <>
      <p className="amend-lines">{text}</p>
      <p className="font-sans text-plain text-umber">{words('amend.talk.by', { by, at: sayInstant(at) })}</p>
    </>
  );
}
