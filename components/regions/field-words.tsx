import type { ReactElement, ReactNode } from 'react';
import { answerWords, questionWords } from '@/components/checks/question-words';
import { StateMark } from '@/components/checks/state-mark';
import type { AnswerValue } from '@/lib/checks/domain/knowledge';
import { findQuestion } from '@/lib/checks/domain/steps';
import { typedAnswer } from '@/lib/checks/domain/typed-answer';
import type { Json } from '@/lib/kernel/canonical-json';
import { words } from '@/lib/kernel/words';
import type { ComparedNames } from '@/lib/regions/domain/compared-editions';
import type { FieldValue } from '@/lib/regions/domain/sheet-difference';
import { ConditionSentence } from './condition-sentence';
import { PayloadDetail } from './payload-details';
import { MemoryMark } from './strength-line';

type Props = { readonly value: FieldValue | null; readonly names: ComparedNames };

/** What one version has in a field, in words. */
export function FieldWords({ value, names }: Props): ReactElement {
  if (value === null) return <span className="text-umber">{words('editions.nothing')}</span>;
  switch (value.kind) {
    case 'text':
      return <>{value.text}</>;
    case 'texts':
      return <Lines items={value.texts.map((text) => [text, text])} />;
    case 'link':
      return (
        <a className="wrap-anywhere" href={value.href}>
          {value.href}
        </a>
      );
    case 'detail':
      return (
        <>
          <PayloadDetail line={value.line} /> {'fromMemory' in value.line ? <MemoryMark /> : null}
        </>
      );
    case 'condition':
      return <ConditionSentence condition={value.condition} names={names} of={value.of} />;
    case 'rules':
      return <Lines items={value.ids.map((id) => [id, <RuleLink key={id} id={id} names={names} />])} />;
    case 'questions':
      return <Lines items={value.ids.map((id) => [id, shortOf(id)])} />;
    case 'citation':
      return <Cited {...value} />;
    case 'exceptions':
      return (
        <Lines
          items={value.except.map(({ rule, why }) => [
            rule,
            <>
              <RuleLink id={rule} names={names} />: {why}
            </>,
          ])}
        />
      );
    case 'answers':
      return <Lines items={Object.entries(value.answers).map(([id, answer]) => [id, sayAnswer(id, answer, names)])} />;
    case 'expected':
      return (
        <Lines
          items={Object.entries(value.expected).map(([rule, status]) => [
            rule,
            <>
              <RuleLink id={rule} names={names} />: <StateMark state={status} />
            </>,
          ])}
        />
      );
  }
}

/** A rule by its title, leading to its page where it has one. */
export function RuleLink({ id, names }: { readonly id: string; readonly names: ComparedNames }): ReactElement {
  const title = names.rules.get(id) ?? id;
  return names.proposed?.has(id) === true ? <>{title}</> : <a href={`/rules/${id}`}>{title}</a>;
}

function Lines({ items }: { readonly items: readonly (readonly [key: string, said: ReactNode])[] }): ReactElement {
  return (
    <ul className={items.length > 1 ? 'list-disc ps-6' : undefined}>
      {items.map(([key, said]) => (
        <li key={key}>{said}</li>
      ))}
    </ul>
  );
}

const shortOf = (id: string): string => (findQuestion(id) === null ? id : questionWords(id, 'short'));

/** An answer as a trial piece holds it; one that makes no sense stands as it was written. */
function sayAnswer(id: string, written: Json, names: ComparedNames): string {
  const question = findQuestion(id);
  const answer: AnswerValue | null = question === null ? null : typedAnswer(question, written);
  const value = question === null || answer === null ? JSON.stringify(written) : answerWords(question, answer, names.regions);
  return words('editions.pair', { name: shortOf(id), value });
}

type CitationProps = Omit<Extract<FieldValue, { readonly kind: 'citation' }>, 'kind'>;

/** A use of a source: the place in it, whose word it is, and the passage in its own language. */
function Cited({ title, citation: { locator, standing, evidence, passage, passageLang } }: CitationProps): ReactElement {
  return (
    <>
      <cite>{locator === undefined ? title : words('editions.cited', { title, locator })}</cite>. {words(`regions.source.${standing}`)}.{' '}
      {evidence === 'memory' ? <MemoryMark /> : null}
      {passage === undefined ? (
        <span className="block">{words('regions.source.noPassage')}</span>
      ) : (
        <blockquote lang={passageLang} className="my-1 border-s-2 border-rule ps-3">
          <p>{words('regions.source.passage', { passage })}</p>
        </blockquote>
      )}
    </>
  );
}
