import type { ReactElement } from 'react';
import { optionWords, questionWords, unitShort } from '@/components/checks/question-words';
import { QUESTIONS, TOPICS, type Question } from '@/lib/checks/domain/questions';
import { words, wordsAt } from '@/lib/kernel/words';
import {
  askedBy,
  conditionIn,
  depthOf,
  JOINS,
  linesOf,
  MOST_DEEP,
  MOST_LINES,
  ROOT,
  ROOT_JOINS,
  waysOf,
  type Asked,
  type EntryLine,
  type EntryPart,
} from '@/lib/regions/domain/condition-entry';
import { DoButton, SelectInput, TextInput, TickInputs, type FormView, type Option } from './form-view';

const LIST: readonly Question[] = QUESTIONS;

/** Questions in their groups. */
const questionGroups = (): readonly { readonly label: string; readonly options: readonly Option[] }[] =>
  TOPICS.map((topic) => ({
    label: words(`checks.topics.${topic}`),
    options: LIST.filter((question) => question.topic === topic).map(({ id }) => ({ value: id, label: questionWords(id, 'short') })),
  }));

type Props = { readonly view: FormView };

/** When it applies: blocks of lines, each line a question with what its answer must be. */
export function ConditionFields({ view }: Props): ReactElement {
  const { parts } = conditionIn(view.values);
  return (
    <div className="flex flex-col gap-4">
      <SelectInput
        view={view}
        name={`${ROOT}.join`}
        label={words('amend.condition.root')}
        options={ROOT_JOINS.map((join) => ({ value: join, label: words(`amend.condition.join.${join}`) }))}
      />
      <Parts view={view} path={ROOT} parts={parts} room={MOST_LINES - linesOf(parts)} />
    </div>
  );
}

type PartsProps = Props & { readonly path: string; readonly parts: readonly EntryPart[]; readonly room: number };

function Parts({ view, path, parts, room }: PartsProps): ReactElement {
  const depth = depthOf(path) + 1;
  return (
    <>
      <ol className="amend-parts" role="list">
        {parts.map((part) => (
          <li key={part.path}>
            {part.kind === 'line' ? (
              <LineFields view={view} line={part} />
            ) : (
              <BlockFields view={view} path={part.path} parts={part.parts} room={room} />
            )}
          </li>
        ))}
      </ol>
      {room <= 0 ? (
        <p className="field-hint">{words('amend.condition.full')}</p>
      ) : (
        <div className="flex flex-wrap gap-3">
          <DoButton act={`add-line:${path}`} about={placeWords(path)}>
            {words('amend.condition.addLine')}
          </DoButton>
          {depth >= MOST_DEEP
            ? null
            : JOINS.map((join) => (
                <DoButton key={join} act={`add-block:${path}:${join}`} about={placeWords(path)}>
                  {words(`amend.condition.addBlock.${join}`)}
                </DoButton>
              ))}
        </div>
      )}
    </>
  );
}

/** "line 2.1": where a part stands, counted from one. */
const numberOf = (path: string): string =>
  path
    .split('.')
    .slice(1)
    .map((place) => String(Number(place) + 1))
    .join('.');
const placeWords = (path: string): string =>
  path === ROOT ? words('amend.condition.whole') : words('amend.condition.block', { number: numberOf(path) });

function BlockFields({ view, path, parts, room }: PartsProps): ReactElement {
  return (
    <fieldset className="amend-block">
      <legend className="font-sans text-plain font-strong">{placeWords(path)}</legend>
      <div className="flex flex-col gap-4">
        <SelectInput
          view={view}
          name={`${path}.join`}
          label={words('amend.condition.blockJoin')}
          options={JOINS.map((join) => ({ value: join, label: words(`amend.condition.join.${join}`) }))}
        />
        <Parts view={view} path={path} parts={parts} room={room} />
        <div>
          <DoButton act={`remove:${path}`} about={placeWords(path)}>
            {words('amend.condition.removeBlock')}
          </DoButton>
        </div>
      </div>
    </fieldset>
  );
}

function LineFields({ view, line }: Props & { readonly line: EntryLine }): ReactElement {
  const { path, question } = line;
  const asked = askedBy(question);
  const about = words('amend.condition.line', { number: numberOf(path) });
  return (
    <fieldset className="amend-line">
      <legend className="font-sans text-plain font-strong">{about}</legend>
      <div className="amend-row">
        <SelectInput
          view={view}
          name={`${path}.question`}
          label={words('amend.condition.question')}
          options={[{ value: 'term', label: words('amend.condition.term') }]}
          groups={questionGroups()}
        />
        <DoButton act={`show:${path}.${asked === null ? 'question' : 'by'}`} about={about}>
          {words(asked === null ? 'amend.condition.show' : 'amend.condition.showAgain')}
        </DoButton>
      </div>
      {asked === null ? null : <AskedFields view={view} path={path} asked={asked} />}
      <div>
        <DoButton act={`remove:${path}`} about={about}>
          {words('amend.condition.removeLine')}
        </DoButton>
      </div>
    </fieldset>
  );
}

type AskedProps = Props & { readonly path: string; readonly asked: Asked };

function AskedFields({ view, path, asked }: AskedProps): ReactElement {
  return (
    <div className="amend-row">
      <SelectInput
        view={view}
        name={`${path}.by`}
        label={words('amend.condition.by')}
        options={waysOf(asked).map((way) => ({ value: way, label: wayWords(asked, way) }))}
      />
      <ValueFields view={view} path={path} asked={asked} />
    </div>
  );
}

const wayWords = (asked: Asked, way: string): string =>
  asked.kind === 'yesno' ? questionWords(asked.id, way === 'yes' ? 'yes' : 'no') : (wordsAt(`amend.condition.way.${way}`) ?? way);

function ValueFields({ view, path, asked }: AskedProps): ReactElement | null {
  const name = `${path}.value`;
  switch (asked.kind) {
    case 'yesno':
      return null;
    case 'choice':
    case 'several':
      return (
        <TickInputs
          view={view}
          name={`${path}.values`}
          legend={words('amend.condition.options')}
          options={asked.options.map((value) => ({ value, label: optionWords(asked.id, value) }))}
        />
      );
    case 'amount':
      return (
        <>
          <TextInput view={view} name={name} label={words('amend.condition.amount')} kind="number" />
          <SelectInput view={view} name={`${path}.unit`} label={words('amend.condition.unit')} options={unitsFor(asked.unit)} />
        </>
      );
    case 'money':
      return (
        <>
          <TextInput view={view} name={name} label={words('amend.condition.amount')} kind="number" />
          <TextInput view={view} name={`${path}.unit`} label={words('amend.condition.currency')} />
        </>
      );
    case 'region':
      return <SelectInput view={view} name={name} label={words('amend.condition.place')} options={placeOptions(view)} />;
    case 'term':
      return <SelectInput view={view} name={name} label={words('amend.condition.word')} options={termOptions(view)} />;
  }
}

const UNITS: Readonly<Record<string, readonly string[]>> = { mm: ['mm', 'cm'], mL: ['mL', 'L'], kg: ['kg', 'g'] };
const unitsFor = (unit: string): readonly Option[] => (UNITS[unit] ?? [unit]).map((value) => ({ value, label: unitShort(value) }));

export const placeOptions = ({ ground }: FormView): readonly Option[] =>
  ground.places.map(({ code, name }) => ({ value: code, label: words('amend.condition.placeOption', { name, code: code.toUpperCase() }) }));

/** The nearest first: of two words with one id the most local one is meant. */
const termOptions = ({ ground }: FormView): readonly Option[] => {
  const nearest = new Map(ground.terms.map(({ id, name, region }) => [id, { name, region }]));
  return [...nearest]
    .map(([value, { name, region }]) => ({ value, label: words('amend.condition.wordOption', { name, code: region.toUpperCase() }) }))
    .toReversed();
};
