import type { ReactElement } from 'react';
import { PlaceChoices, type PlaceChoice } from '@/components/site/place-choices';
import { ErrorSummary } from '@/components/ui/error-summary';
import { Field } from '@/components/ui/field';
import { controlProps } from '@/components/ui/field';
import { PageHeading } from '@/components/ui/page-heading';
import { SubmitButton } from '@/components/ui/submit-button';
import { noteAnswerText, type NoteAnswer } from '@/lib/checks/domain/note-answer';
import { words } from '@/lib/kernel/words';
import { answerWords, questionWords } from './question-words';

type Props = {
  readonly address: string;
  readonly places: readonly PlaceChoice[];
  readonly chosen: readonly string[];
  readonly saleOn: string;
  /** Why the form came back: no place, a bad day, or a place without a sheet. */
  readonly why: string | null;
  /** The answer of the note this check begins from. */
  readonly fromNote?: NoteAnswer | null;
  readonly submit: string;
  readonly act: (form: FormData) => Promise<void>;
};

/** What to mend, with the field it belongs to. */
function faultOf(why: string | null, first: string): { readonly id: string; readonly said: string } | null {
  if (why === null) return null;
  if (why === 'day') return { id: 'on', said: words('checks.places.badDay') };
  if (why.startsWith('unknown:')) return { id: first, said: words('checks.places.unknown', { code: why.slice('unknown:'.length) }) };
  return { id: first, said: words('checks.places.missing') };
}

/** Where a piece is sold and when: the first page of a check, and the page to change it. */
export function PlacesForm(props: Props): ReactElement {
  const { address, places, chosen, saleOn, submit, act, fromNote = null } = props;
  const fault = faultOf(props.why, 'region');
  const day = {
    label: words('checks.places.day'),
    hint: words('checks.places.dayHint'),
    error: fault?.id === 'on' ? fault.said : undefined,
  };
  return (
    <form action={act} noValidate className="flex flex-col gap-6">
      {fault === null ? null : <ErrorSummary heading={words('checks.faults.heading', { count: 1 })} faults={[fault]} tries={1} />}
      <PageHeading>{words('checks.places.title')}</PageHeading>
      <p>{words('checks.places.why')}</p>
      {fromNote === null ? null : <FromNote answer={fromNote} />}
      <input type="hidden" name="key" value={address} />
      <PlaceChoices
        id="region"
        name="region"
        legend={words('checks.places.legend')}
        hint={words('checks.places.hint')}
        error={fault?.id === 'region' ? fault.said : undefined}
        places={places}
        chosen={chosen}
      />
      <p className="field-hint">
        {words('checks.places.notHere')} {words.rich('checks.places.notHereText', { link: (said) => <a href="/regions">{said}</a> })}
      </p>
      <Field id="on" {...day}>
        <input type="date" className="control" name="on" defaultValue={saleOn} {...controlProps('on', day)} />
      </Field>
      <div>
        <SubmitButton busy={words('checks.places.busy')}>{submit}</SubmitButton>
      </div>
    </form>
  );
}

const NO_NAMES: ReadonlyMap<string, string> = new Map();

/** What of a note will stand in its field when the question comes. */
function FromNote({ answer: { question, value } }: { readonly answer: NoteAnswer }): ReactElement {
  const answer = answerWords(question, value, NO_NAMES);
  return (
    <div className="panel panel-celadon">
      <p>{words('checks.places.fromNote', { question: questionWords(question.id, 'short'), answer })}</p>
      <p>{words('checks.places.fromNoteChange')}</p>
      <input type="hidden" name="with" value={noteAnswerText({ question, value })} />
    </div>
  );
}
