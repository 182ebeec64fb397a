import type { ReactElement } from 'react';
import { words, wordsAt } from '@/lib/kernel/words';
import { rowsIn, textIn } from '@/lib/regions/domain/entry';
import { fieldsOf, payloadName, TOPICS, type PayloadField } from '@/lib/regions/domain/payload-fields';
import { DoButton, SelectInput, TextInput, type FormView } from './form-view';

type Props = { readonly view: FormView };

/** What a rule is about, and the fields that belong to that. */
export function PayloadFields({ view }: Props): ReactElement {
  const topic = textIn(view.values, payloadName('topic'));
  return (
    <>
      <div className="amend-row">
        <SelectInput
          view={view}
          name={payloadName('topic')}
          label={words('amend.payload.topic')}
          options={TOPICS.map((value) => ({ value, label: wordsAt(`amend.topic.${value}`) ?? value }))}
        />
        <DoButton act={`show:${payloadName('topic')}`}>{words('amend.payload.show')}</DoButton>
      </div>
      {fieldsOf(topic).map((field) => (
        <PayloadInput key={field.name} view={view} field={field} topic={topic} />
      ))}
    </>
  );
}

type InputProps = Props & { readonly field: PayloadField; readonly topic: string };

/** `amount.value` is named in the messages as `amountValue`. */
const wordKey = (name: string): string => name.replaceAll(/\.([a-z])/g, (_, letter: string) => letter.toUpperCase());
const labelOf = ({ name }: PayloadField, topic: string): string =>
  wordsAt(`amend.payload.of.${topic}.${wordKey(name)}`) ?? wordsAt(`amend.payload.${wordKey(name)}`) ?? name;

function PayloadInput({ view, field, topic }: InputProps): ReactElement {
  const name = payloadName(field.name);
  const label = labelOf(field, topic);
  const plain = { view, name, label, ...(field.isNeeded === true ? {} : { optional: true as const }) };
  switch (field.kind) {
    case 'number':
      return <TextInput {...plain} kind="number" unit={field.unit === undefined ? undefined : unitWords(field.unit)} />;
    case 'long':
      return <TextInput {...plain} kind="long" />;
    case 'lines':
      return <TextInput {...plain} kind="long" hint={words('amend.payload.lines')} />;
    case 'link':
      return <TextInput {...plain} kind="url" />;
    case 'date':
      return <TextInput {...plain} kind="date" />;
    case 'text':
      return <TextInput {...plain} />;
    case 'yesno':
      return <SelectInput {...plain} none={words('amend.payload.notSaid')} options={yesNo()} />;
    case 'choice':
      return <SelectInput {...plain} options={field.options.map((value) => ({ value, label: optionLabel(field.name, value) }))} />;
    case 'tolerance':
      return <ToleranceInput view={view} name={name} label={label} unit={unitWords(field.unit)} />;
    case 'money':
      return <MoneyInput view={view} name={name} label={label} />;
    case 'words':
      return <WordsInput view={view} name={name} label={label} />;
  }
}

export const yesNo = (): readonly { value: string; label: string }[] => [
  { value: 'yes', label: words('amend.form.yes') },
  { value: 'no', label: words('amend.form.no') },
];

const unitWords = (unit: string): string => wordsAt(`amend.unit.${unit}`) ?? wordsAt(`regions.unit.${unit}`) ?? unit;

/** Units say themselves; other options have words. */
function optionLabel(name: string, value: string): string {
  if (name === 'amount.unit') return wordsAt(`regions.unit.${value}`) ?? value;
  return wordsAt(`amend.option.${wordKey(name)}.${value}`) ?? value;
}

type PairProps = Props & { readonly name: string; readonly label: string };

function ToleranceInput({ view, name, label, unit }: PairProps & { readonly unit: string }): ReactElement {
  return (
    <div className="amend-row">
      <TextInput view={view} name={`${name}.value`} label={label} kind="number" unit={unit} optional />
      <TextInput
        view={view}
        name={`${name}.plusMinus`}
        label={words('amend.payload.plusMinus', { label })}
        kind="number"
        unit={unit}
        optional
      />
    </div>
  );
}

function MoneyInput({ view, name, label }: PairProps): ReactElement {
  return (
    <div className="amend-row">
      <TextInput view={view} name={`${name}.amount`} label={label} kind="number" optional />
      <TextInput view={view} name={`${name}.currency`} label={words('amend.payload.currencyOf', { label })} optional />
    </div>
  );
}

function WordsInput({ view, name, label }: PairProps): ReactElement {
  const rows = Array.from({ length: rowsIn(view.values, name) }, (_, row) => `${name}.${String(row)}`);
  return (
    <fieldset>
      <legend className="font-sans text-plain font-strong">{label}</legend>
      <p className="field-hint">{words('amend.payload.wordsHint')}</p>
      {rows.map((at, row) => (
        <div key={at} className="amend-row">
          <TextInput view={view} name={`${at}.lang`} label={words('amend.payload.lang', { number: row + 1 })} />
          <TextInput
            view={view}
            name={`${at}.text`}
            label={words('amend.payload.langText', { number: row + 1 })}
            lang={textIn(view.values, `${at}.lang`)}
          />
          <DoButton act={`remove:${at}`}>{words('amend.payload.removeWords', { number: row + 1 })}</DoButton>
        </div>
      ))}
      <DoButton act={`add:${name}`} id={`add-${name}`}>
        {words('amend.payload.addWords')}
      </DoButton>
    </fieldset>
  );
}
