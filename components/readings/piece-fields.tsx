import type { ReactElement } from 'react';
import { optionWords, questionWords, unitShort } from '@/components/checks/question-words';
import { AmountField } from '@/components/ui/amount-field';
import { Choice } from '@/components/ui/choice';
import { FieldGroup } from '@/components/ui/field';
import { SelectField } from '@/components/ui/select-field';
import { unknownField } from '@/lib/checks/domain/entry';
import type { Question } from '@/lib/checks/domain/questions';
import { findQuestion } from '@/lib/checks/domain/steps';
import { words } from '@/lib/kernel/words';
import { PIECE_QUESTIONS } from '@/lib/readings/domain/sheet-entry';
import { firstOf } from '@/lib/readings/domain/typed-rows';
import { errorAt, type FormView } from './form-view';

/** What a limit can turn on, each with "I don't know yet"; an empty field says the same. */
export function PieceFields({ view }: { readonly view: FormView }): ReactElement {
  const questions = PIECE_QUESTIONS.flatMap((id) => findQuestion(id) ?? []);
  return (
    <div className="two-fields">
      {questions.map((question) => (
        <PieceField key={question.id} question={question} view={view} />
      ))}
    </div>
  );
}

type Props = { readonly question: Question; readonly view: FormView };

function PieceField({ question, view }: Props): ReactElement {
  if (question.kind === 'amount') return <PieceAmount question={question} unit={question.unit} view={view} />;
  const unknown = { value: 'unknown', label: words('readings-page.piece.unknown') };
  const options =
    question.kind === 'choice'
      ? question.options.map((value) => ({ value, label: optionWords(question.id, value) }))
      : [
          { value: 'yes', label: words('readings-page.piece.yes') },
          { value: 'no', label: words('readings-page.piece.no') },
        ];
  // A long list has a field of its own for "I don't know yet" elsewhere; here an option serves all.
  return (
    <SelectField
      id={question.id}
      name={question.id}
      label={questionWords(question.id, 'title')}
      error={errorAt(view, question.id)}
      none={words('readings-page.piece.choose')}
      options={[...options, unknown]}
      chosen={firstOf(view.fields, question.id)}
    />
  );
}

function PieceAmount({ question, unit, view }: Props & { readonly unit: string }): ReactElement {
  const box = unknownField(question.id);
  return (
    <FieldGroup id={`${question.id}-group`} legend={questionWords(question.id, 'short')} legendIsHeading>
      <AmountField
        id={question.id}
        name={question.id}
        label={questionWords(question.id, 'title')}
        error={errorAt(view, question.id)}
        unit={unitShort(unit)}
        unitSpoken={questionWords(question.id, 'unit')}
        defaultValue={firstOf(view.fields, question.id)}
      />
      <Choice
        id={box}
        type="checkbox"
        name={box}
        option={{ value: 'on', label: words('readings-page.piece.unknown') }}
        chosen={firstOf(view.fields, box) !== ''}
      />
    </FieldGroup>
  );
}
