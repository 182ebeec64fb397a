import type { ReactElement } from 'react';
import { Disclosure } from '@/components/ui/disclosure';
import type { NearestOutcome, OtherAnswer } from '@/lib/checks/domain/nearest-outcome';
import type { RuleTrace } from '@/lib/checks/domain/trace';
import { sayList } from '@/lib/kernel/say';
import { NO, UNKNOWN, YES, type Tri } from '@/lib/kernel/tri';
import { words } from '@/lib/kernel/words';
import { cellWords } from './cell-words';
import type { ListView } from './list-view';
import { TraceList } from './trace-list';

type Props = { readonly id: string; readonly view: ListView };

const HEADS: Readonly<Record<Tri, 'applies' | 'doesNot' | 'open'>> = { 0: 'doesNot', 1: 'open', 2: 'applies' };

/** Why a line stands as it does: what decides it, what could set it aside, and what would change it. */
export function WhyDetails({ id, view }: Props): ReactElement | null {
  const why = view.whys.get(id);
  if (why === undefined) return null;
  const { trace, nearest } = why;
  return (
    <Disclosure summary={words('checks.why.title')}>
      <div className="font-sans text-plain">
        {trace.when === null ? null : (
          <>
            <p>{words(`checks.why.${HEADS[trace.value]}`)}</p>
            <TraceList trace={trace.when} names={view.sheetNames} />
          </>
        )}
        <Attackers trace={trace} view={view} />
        {nearest === null ? null : <Change nearest={nearest} was={trace.value} view={view} />}
      </div>
    </Disclosure>
  );
}

function Attackers({ trace: { attackers }, view }: { readonly trace: RuleTrace; readonly view: ListView }): ReactElement {
  const titles = (value: Tri): readonly string[] =>
    attackers.flatMap((attacker) => (attacker.value === value ? (view.told.get(attacker.id)?.title ?? attacker.id) : []));
  return (
    <>
      {([YES, UNKNOWN, NO] as const).map((value) =>
        titles(value).length === 0 ? null : (
          <p key={value} className="mt-2">
            {words(`checks.why.attackers.${HEADS[value]}`, { rules: sayList(titles(value)) })}
          </p>
        ),
      )}
    </>
  );
}

type ChangeProps = { readonly nearest: NearestOutcome; readonly was: Tri; readonly view: ListView };

function Change({ nearest: { changes, besides, becomes }, was, view }: ChangeProps): ReactElement {
  const open = becomes === UNKNOWN;
  const would = was === YES ? (open ? 'mayNotApply' : 'notApply') : open ? 'mayApply' : 'apply';
  return (
    <>
      <p className="mt-2 font-strong">{words('checks.why.change')}</p>
      <p>{words(`checks.why.would.${would}`)}</p>
      <ul className="list-disc ps-6">
        {changes.map((change) => (
          <li key={change.question}>
            {view.base === null ? say(change, view) : <a href={`${view.base}/${change.question}`}>{say(change, view)}</a>}
          </li>
        ))}
      </ul>
      {besides.length === 0 ? null : <p>{words('checks.why.besides', { answers: besides.map((one) => say(one, view)).join('; ') })}</p>}
    </>
  );
}

const say = ({ question, cells }: OtherAnswer, view: ListView): string => cellWords(question, cells, view.placeNames);
