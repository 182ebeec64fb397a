import type { ReactElement } from 'react';
import { ConditionSentence } from '@/components/regions/condition-sentence';
import { pieceWords } from '@/components/regions/rule-meaning';
import type { SamplePots } from '@/lib/checks/domain/sample-pots';
import { words } from '@/lib/kernel/words';
import type { Condition } from '@/lib/regions/domain/condition';
import { namesIn, type FormGround } from '@/lib/regions/domain/form-ground';

type Props = {
  /** Null while a line of it is not filled in. */
  readonly condition: Condition | null;
  readonly pots: SamplePots | null;
  readonly ground: FormGround;
  readonly of: 'rule' | 'term';
};

/** What the condition says as it was kept last, and two pieces that show it. */
export function ConditionSaid({ condition, pots, ground, of }: Props): ReactElement {
  const names = namesIn(ground);
  return (
    <aside className="amend-said" aria-label={words('amend.said.label')}>
      <p className="font-sans text-plain font-strong">{words('amend.said.title')}</p>
      {condition === null ? (
        <p className="mt-2">{words('amend.said.open')}</p>
      ) : (
        <ConditionSentence condition={condition} names={names} of={of} />
      )}
      {condition === null || pots === null ? null : (
        <dl className="mt-4 font-sans text-plain">
          {(['yes', 'no'] as const).map((side) => {
            const answers = pots[side];
            return (
              <div key={side} className="mt-2">
                <dt className="font-strong">{words(`amend.said.${of}.${side}`)}</dt>
                <dd>{answers === null ? words(`amend.said.none.${side}`) : pieceWords(answers, names.regions)}</dd>
              </div>
            );
          })}
        </dl>
      )}
      <p className="mt-4">
        <button type="submit" name="do" value="show:when.join" className="button button-plain">
          {words('amend.said.again')}
        </button>
      </p>
    </aside>
  );
}
