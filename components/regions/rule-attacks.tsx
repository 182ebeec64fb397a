import type { ReactElement, ReactNode } from 'react';
import { words } from '@/lib/kernel/words';
import type { NamedRule, RuleNeighbours } from '@/lib/regions/domain/rule-neighbours';
import type { ToldRule } from '@/lib/regions/domain/told-rule';

type Props = { readonly rule: Pick<ToldRule, 'kind'>; readonly neighbours: RuleNeighbours };

/** How a rule meets others: what gives way to it, what it gives way to, and where it does not reach. */
export function RuleAttacks({ rule, neighbours }: Props): ReactElement {
  const { targets, attackers, alongside, leftOutIn } = neighbours;
  return (
    <div className="flex flex-col gap-4">
      {rule.kind === 'adds' ? <p>{words('regions.rule.adds')}</p> : <RuleNames head={words(`regions.rule.${rule.kind}`)} rules={targets} />}
      <RuleNames head={words('regions.rule.replacedBy')} rules={attackers} />
      <RuleNames head={words('regions.rule.alongside')} rules={alongside} />
      {leftOutIn.length === 0 ? null : (
        <HeadedList head={words('regions.rule.leftOut')}>
          {leftOutIn.map(({ region, regionName, why }) => (
            <li key={region}>
              <a href={`/regions/${region}`}>{regionName}</a>
              <p>{why}</p>
            </li>
          ))}
        </HeadedList>
      )}
    </div>
  );
}

function RuleNames({ head, rules }: { readonly head: string; readonly rules: readonly NamedRule[] }): ReactElement | null {
  if (rules.length === 0) return null;
  return (
    <HeadedList head={head}>
      {rules.map(({ id, title, regionName }) => (
        <li key={id}>
          <a href={`/rules/${id}`}>{words('regions.rule.inSheet', { title, region: regionName })}</a>
        </li>
      ))}
    </HeadedList>
  );
}

function HeadedList({ head, children }: { readonly head: string; readonly children: ReactNode }): ReactElement {
  return (
    <div>
      <p>{head}</p>
      <ul className="ms-6 list-disc">{children}</ul>
    </div>
  );
}
