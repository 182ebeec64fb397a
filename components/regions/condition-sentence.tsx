import type { ReactElement, ReactNode } from 'react';
import { words } from '@/lib/kernel/words';
import type { Condition } from '@/lib/regions/domain/condition';
import { sayCondition, type SaidCondition } from '@/lib/regions/domain/condition-words';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';

type Props = {
  readonly condition: Condition;
  readonly names: SheetNames;
  /** A rule applies; a term holds. */
  readonly of?: 'rule' | 'term';
};

type Parts = readonly SaidCondition[];
const strong = (said: ReactNode): ReactElement => <strong className="font-strong">{said}</strong>;

/** When a rule applies or a term holds, as a sentence that branches into lists. */
export function ConditionSentence({ condition, names, of = 'rule' }: Props): ReactElement {
  const said = sayCondition(condition, names);
  const at = of === 'rule' ? 'regions.condition' : 'regions.condition.hold';
  if (said.kind === 'always' || said.kind === 'never') return <p>{words(`${at}.${said.kind}`)}</p>;
  const list = said.kind === 'line' ? { parts: [said], unless: [] } : said;
  const head = said.kind === 'line' ? words(`${at}.when`) : words.rich(`${at}.${said.join}`, { count: said.parts.length, b: strong });
  return (
    <div className="font-sans text-plain">
      <p>{head}</p>
      <Lists {...list} names={names} />
    </div>
  );
}

type ListsProps = { readonly parts: Parts; readonly unless: Parts; readonly names: SheetNames };

function Lists({ parts, unless, names }: ListsProps): ReactElement {
  return (
    <>
      <PartList parts={parts} names={names} />
      {unless.length === 0 ? null : (
        <>
          <p>{words.rich('regions.condition.unless', { count: unless.length, b: strong })}</p>
          <PartList parts={unless} names={names} />
        </>
      )}
    </>
  );
}

function PartList({ parts, names }: Pick<ListsProps, 'parts' | 'names'>): ReactElement {
  return (
    <ul className="ms-6 list-disc">
      {parts.map((part, place) => (
        <li key={place}>
          <Part said={part} names={names} />
        </li>
      ))}
    </ul>
  );
}

function Part({ said, names }: { readonly said: SaidCondition; readonly names: SheetNames }): ReactElement {
  if (said.kind === 'always' || said.kind === 'never') return <>{words(`regions.condition.part.${said.kind}`)}</>;
  if (said.kind === 'line') return <Line said={said} names={names} />;
  return (
    <>
      {words.rich(`regions.condition.part.${said.join}`, { count: said.parts.length, b: strong })}
      <Lists parts={said.parts} unless={said.unless} names={names} />
    </>
  );
}

type LineProps = { readonly said: Extract<SaidCondition, { kind: 'line' }>; readonly names: SheetNames };

/** A term leads to its definition, on the sheet that holds it. */
function Line({ said: { text, term }, names }: LineProps): ReactElement {
  const home = term === undefined ? undefined : names.terms.get(term);
  if (term === undefined || home === undefined) return <>{text}</>;
  return <a href={`/regions/${home.region}#term-${term}`}>{text}</a>;
}
