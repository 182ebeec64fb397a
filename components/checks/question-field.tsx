import type { ReactElement, ReactNode } from 'react';
import { AmountField } from '@/components/ui/amount-field';
import { CheckboxGroup } from '@/components/ui/checkbox-group';
import { Choice } from '@/components/ui/choice';
import { FieldGroup } from '@/components/ui/field';
import { RadioGroup } from '@/components/ui/radio-group';
import { SelectField } from '@/components/ui/select-field';
import { moneyField, unknownField, type Fields } from '@/lib/checks/domain/entry';
import { RADIOS } from '@/lib/checks/domain/fields-of-said';
import type { Question } from '@/lib/checks/domain/questions';
import { words } from '@/lib/kernel/words';
import { optionWords, questionWords, unitShort } from './question-words';

export type PlaceOption = { readonly value: string; readonly label: string };

/** Where an answer comes from that is filled in before the maker said so: from the form of the piece, or from a studio note. */
export type FilledBy = 'form' | 'note';

type Props = {
  readonly question: Question;
  /** The page asks this question alone: its title is the heading already. */
  readonly alone: boolean;
  readonly fields: Fields;
  readonly error?: string | undefined;
  /** What stands there is not of the maker's saying. */
  readonly filledBy?: FilledBy | undefined;
  readonly currencies: readonly string[];
  readonly places: readonly PlaceOption[];
  readonly tries: number;
};

const unknown = () => ({ value: 'unknown', label: words('checks.question.unknown'), hint: words('checks.question.unknownHint') });

/** The control of one question, with what was said or typed before, and "I don't know yet" last. */
export function QuestionField(props: Props): ReactElement {
  const { question, fields, alone, error, filledBy } = props;
  const legend = questionWords(question.id, 'title');
  const group = { id: question.id, name: question.id, legend, error, ...(alone ? { legendIsHeading: true as const } : {}) };
  const hint = hintOf(question, alone, filledBy);
  const chosen = fields[question.id] ?? [];
  switch (question.kind) {
    case 'yesno':
      return <RadioGroup {...group} hint={hint} options={yesNo(question.id)} last={unknown()} chosen={chosen[0]} />;
    case 'several':
      return (
        <CheckboxGroup
          {...group}
          hint={hint ?? words('checks.question.several')}
          options={question.options.map((value) => ({ value, label: optionWords(question.id, value) }))}
          last={[{ value: 'none', label: words('checks.question.noneOf') }, unknown()]}
          chosen={chosen}
        />
      );
    case 'choice':
      return question.options.length > RADIOS ? (
        <LongChoice {...props} options={question.options.map((value) => ({ value, label: optionWords(question.id, value) }))} />
      ) : (
        <RadioGroup
          {...group}
          hint={hint}
          options={question.options.map((value) => ({ value, label: optionWords(question.id, value) }))}
          last={unknown()}
          chosen={chosen[0]}
        />
      );
    case 'region':
      return <LongChoice {...props} options={props.places} />;
    case 'amount':
      return <Amount {...props} unit={question.unit} />;
    case 'money':
      return <MoneyFields {...props} />;
  }
}

const hintOf = ({ id }: Question, alone: boolean, filledBy: FilledBy | undefined): string | undefined => {
  if (filledBy !== undefined) return words(`checks.question.filledBy.${filledBy}`);
  return alone ? undefined : questionWords(id, 'why');
};

const yesNo = (id: string) => [
  { value: 'yes', label: questionWords(id, 'yes') },
  { value: 'no', label: questionWords(id, 'no') },
];

function Unknown({ question, fields }: Pick<Props, 'question' | 'fields'>): ReactElement {
  const name = unknownField(question.id);
  const option = { ...unknown(), value: 'on' };
  return <Choice id={name} type="checkbox" name={name} option={option} chosen={(fields[name] ?? []).length > 0} apart />;
}

function LongChoice({
  question,
  fields,
  error,
  tries,
  options,
  filledBy,
}: Props & { readonly options: readonly PlaceOption[] }): ReactElement {
  return (
    <Together question={question} fields={fields}>
      <SelectField
        id={question.id}
        name={question.id}
        label={questionWords(question.id, 'title')}
        hint={filledBy === undefined ? undefined : words(`checks.question.filledBy.${filledBy}`)}
        error={error}
        none={words('checks.question.choose')}
        options={options}
        chosen={fields[question.id]?.[0]}
        tries={tries}
      />
    </Together>
  );
}

function Amount({ question, fields, error, unit, filledBy }: Props & { readonly unit: string }): ReactElement {
  return (
    <Together question={question} fields={fields}>
      <AmountField
        id={question.id}
        name={question.id}
        label={questionWords(question.id, 'title')}
        hint={filledBy === undefined ? questionWords(question.id, 'example') : words(`checks.question.filledBy.${filledBy}`)}
        error={error}
        unit={unitShort(unit)}
        unitSpoken={questionWords(question.id, 'unit')}
        defaultValue={fields[question.id]?.[0]}
      />
    </Together>
  );
}

function MoneyFields({ question, fields, error, currencies }: Props): ReactElement {
  const short = questionWords(question.id, 'short');
  return (
    <Together question={question} fields={fields}>
      {currencies.map((currency, place) => (
        <AmountField
          key={currency}
          id={moneyField(question.id, currency)}
          name={moneyField(question.id, currency)}
          label={words('checks.question.moneyIn', { question: short, currency })}
          hint={place === 0 ? questionWords(question.id, 'example') : undefined}
          error={place === 0 ? error : undefined}
          unit={currency}
          unitSpoken={currency}
          defaultValue={fields[moneyField(question.id, currency)]?.[0]}
        />
      ))}
    </Together>
  );
}

/** A typed field and its "I don't know yet", kept together for assistive technology. */
function Together({ question, fields, children }: Pick<Props, 'question' | 'fields'> & { readonly children: ReactNode }): ReactElement {
  return (
    <FieldGroup id={`${question.id}-group`} legend={questionWords(question.id, 'short')} legendIsHeading>
      {children}
      <Unknown question={question} fields={fields} />
    </FieldGroup>
  );
}
