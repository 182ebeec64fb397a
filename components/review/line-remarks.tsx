import type { ReactElement } from 'react';
import type { EntryState } from '@/components/accounts/entry-form';
import { Badge } from '@/components/ui/badge';
import { Disclosure } from '@/components/ui/disclosure';
import { sayInstant } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Remark } from '@/lib/regions/domain/amendment-view';
import { remarksAnchor } from './anchors';
import { RemarkForm } from './remark-form';

type Act = (prev: EntryState, form: FormData) => Promise<EntryState>;

/** What whoever decides may do with remarks. `first`: the state of a form, which is a kept one where that was refused without script. */
export type RemarkActs = {
  readonly amendment: string;
  readonly busy: string;
  readonly add: Act;
  readonly answer: Act;
  readonly mark: (form: FormData) => Promise<void>;
  readonly first: (about: string) => EntryState;
  /** The line that something was just kept on, or whose form came back. */
  readonly atLine: string | null;
  /** Something was kept. */
  readonly isKept: boolean;
};

type Props = { readonly line: string; readonly name: string; readonly remarks: readonly Remark[]; readonly acts: RemarkActs | null };

/** The remarks on one line, folded until there is one that waits, and the form for another. */
export function LineRemarks({ line, name, remarks, acts }: Props): ReactElement | null {
  if (acts === null && remarks.length === 0) return null;
  const isHere = acts?.atLine === line;
  return (
    <div id={remarksAnchor(line)} className="remarks">
      <Disclosure
        open={isHere || remarks.some(({ isAnswered }) => !isAnswered)}
        summary={
          <>
            {words('review.remark.open', { count: remarks.length })}{' '}
            <span className="sr-only">{words('review.remark.openOf', { line: name })}</span>
          </>
        }
      >
        {isHere && acts.isKept ? (
          <p role="status" tabIndex={-1} data-arrival="" className="mb-3 font-strong">
            {words('review.remark.kept')}
          </p>
        ) : null}
        {remarks.map((remark) => (
          <RemarkThread key={remark.id} remark={remark} line={name} acts={acts} />
        ))}
        {acts === null ? null : (
          <RemarkForm
            key={remarks.length}
            action={acts.add}
            first={acts.first(line)}
            hidden={{ id: acts.amendment, line }}
            label={words('review.remark.field')}
            hint={words('review.remark.hint')}
            submit={words('review.remark.submit')}
            busy={acts.busy}
          />
        )}
      </Disclosure>
    </div>
  );
}

type ThreadProps = { readonly remark: Remark; readonly line: string; readonly acts: RemarkActs | null };

/** A remark, the answers to it, and what can be done about it. */
export function RemarkThread({ remark, line, acts }: ThreadProps): ReactElement {
  const { by, isOwn, at, words: said, answers, isAnswered } = remark;
  return (
    <div className="remark">
      <Said by={isOwn ? words('review.remark.you') : by} at={at} said={said} />
      {answers.map((answer) => (
        <div key={answer.id} className="remark-answer">
          <Said {...answer} said={answer.words} />
        </div>
      ))}
      <p>
        <Badge colour={isAnswered ? 'celadon' : 'ash'}>{words(isAnswered ? 'review.remark.answered' : 'review.remark.waits')}</Badge>
      </p>
      {acts === null ? null : <ThreadActs remark={remark} line={line} acts={acts} />}
    </div>
  );
}

type SaidProps = { readonly by: string; readonly at: Date; readonly said: string };

function Said({ by, at, said }: SaidProps): ReactElement {
  return (
    <>
      <p className="text-umber">{words('review.remark.by', { by, at: sayInstant(at) })}</p>
      <p className="whitespace-pre-line wrap-anywhere">{said}</p>
    </>
  );
}

type ActsProps = Pick<ThreadProps, 'remark' | 'line'> & { readonly acts: RemarkActs };

function ThreadActs({ remark, line, acts }: ActsProps): ReactElement {
  const { id, by, isAnswered, answers } = remark;
  const about = words('review.remark.about', { by, line });
  const first = acts.first(id);
  return (
    <>
      <form action={acts.mark}>
        {Object.entries({
          key: acts.first('').key,
          id: acts.amendment,
          remark: id,
          line: remark.line,
          answered: isAnswered ? 'no' : 'yes',
        }).map(([name, value]) => (
          <input key={name} type="hidden" name={name} value={value} />
        ))}
        <button type="submit" className="button button-plain">
          {words(isAnswered ? 'review.remark.unmark' : 'review.remark.mark')}
          <span className="sr-only">: {about}</span>
        </button>
      </form>
      <Disclosure
        open={Object.keys(first.errors).length > 0}
        summary={
          <>
            {words('review.remark.answer')}
            <span className="sr-only">: {about}</span>
          </>
        }
      >
        <RemarkForm
          key={answers.length}
          action={acts.answer}
          first={first}
          hidden={{ id: acts.amendment, remark: id, line: remark.line }}
          label={words('review.remark.answerField')}
          hint={words('review.remark.hint')}
          submit={words('review.remark.submitAnswer')}
          busy={acts.busy}
        />
      </Disclosure>
    </>
  );
}

type AllProps = {
  readonly remarks: readonly Remark[];
  readonly names: ReadonlyMap<string, string>;
  readonly acts: RemarkActs | null;
};

/** Every remark once more, in order; those on a line that is no longer changed can be answered here alone. */
export function AllRemarks({ remarks, names, acts }: AllProps): ReactElement {
  return (
    <>
      <p className="mt-2">{words('review.remark.all', { count: remarks.length })}</p>
      <ol className="mt-3 flex flex-col gap-4">
        {remarks.map((remark) => {
          const name = names.get(remark.line);
          return (
            <li key={remark.id}>
              <p className="font-strong">
                {name === undefined ? words('review.remark.gone') : <a href={`#${remarksAnchor(remark.line)}`}>{name}</a>}
              </p>
              <RemarkThread remark={remark} line={name ?? words('review.remark.gone')} acts={name === undefined ? acts : null} />
            </li>
          );
        })}
      </ol>
    </>
  );
}
