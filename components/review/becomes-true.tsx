import type { ReactElement, ReactNode } from 'react';
import { FieldWords, RuleLink } from '@/components/regions/field-words';
import { RuleMeaningWords } from '@/components/regions/rule-meaning';
import { sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import { changedMeanings, type ComparedEditions, type ComparedNames } from '@/lib/regions/domain/compared-editions';
import type { FieldDifference, ItemDifference } from '@/lib/regions/domain/sheet-difference';
import { sideOf } from '@/lib/regions/domain/text-difference';

type Props = { readonly compared: Pick<ComparedEditions, 'items' | 'names'> };

/** Every change as a sentence: what is said from then on, without what was said before. */
export function BecomesTrue({ compared: { items, names } }: Props): ReactElement {
  if (items.length === 0) return <p>{words('review.becomes.nothing')}</p>;
  return (
    <ul className="becomes">
      {items.map((item) => (
        <li key={`${item.list} ${item.id}`}>
          <ItemSentence item={item} names={names} />
        </li>
      ))}
    </ul>
  );
}

type ItemProps = { readonly item: ItemDifference; readonly names: ComparedNames };

function ItemSentence({ item, names }: ItemProps): ReactElement {
  const { list, change } = item;
  const title = list === 'memberships' ? (names.regions.get(item.title) ?? item.title) : item.title;
  if (change === 'moved') return <p>{words('review.becomes.moved', { title })}</p>;
  const fields = change === 'withdrawn' ? [] : item.fields.filter(({ field }) => !isLeftOut(field, change));
  return (
    <>
      <p className="font-strong">{words(`review.becomes.${change}.${list}`, { title })}</p>
      {fields.length === 0 ? null : (
        <ul className="becomes-fields">
          {fields.map((field, place) => (
            <li key={place}>
              <FieldSentence field={field} item={item} names={names} />
            </li>
          ))}
        </ul>
      )}
    </>
  );
}

/** What says nothing to a reader; of something new its title, which the sentence has already. */
const isLeftOut = (field: FieldDifference['field'], change: ItemDifference['change']): boolean =>
  field === 'facts' || (change === 'added' && (field === 'title' || field === 'name'));

type FieldProps = ItemProps & { readonly field: FieldDifference };

function FieldSentence({ field, item, names }: FieldProps): ReactElement {
  return (
    <>
      <span className="becomes-name">{nameOf(field, item)}:</span> <After field={field} names={names} />
    </>
  );
}

/** A word has its condition and its text under other names than a rule. */
const TERM_FIELDS: Partial<Record<FieldDifference['field'], 'holds' | 'definition'>> = { when: 'holds', says: 'definition' };

function nameOf({ field, name }: FieldDifference, { list }: ItemDifference): string {
  if (field === 'detail' && name !== null) return name;
  return words(`editions.field.${(list === 'terms' ? TERM_FIELDS[field] : undefined) ?? field}`);
}

/** What a field says from then on. Long texts are read among the differences. */
function After({ field, names }: Omit<FieldProps, 'item'>): ReactNode {
  if (field.field === 'text') return words('review.becomes.long');
  if (field.kind === 'values')
    return field.after === null ? words('review.becomes.gone') : <FieldWords value={field.after} names={names} />;
  const { difference } = field;
  if (difference.kind !== 'changed') return words(difference.kind === 'layout' ? 'review.becomes.layout' : 'review.becomes.long');
  return sideOf(difference.passages, 'after')
    .map((passage) => (passage.kind === 'changed' ? passage.parts.map(({ text }) => text).join('') : passage.text))
    .join(' ');
}

type EffectProps = { readonly compared: ComparedEditions; readonly needsSecond: boolean };

/** Where it becomes true, for which pieces, and from when. */
export function Effects({ compared, needsSecond }: EffectProps): ReactElement {
  const number = compared.to.number;
  return (
    <dl className="definitions">
      <div>
        <dt>{words('review.becomes.where')}</dt>
        <dd>
          <Where compared={compared} />
        </dd>
      </div>
      <div>
        <dt>{words('review.becomes.pieces')}</dt>
        <dd>
          <Pieces compared={compared} />
        </dd>
      </div>
      <div>
        <dt>{words('review.becomes.when')}</dt>
        <dd>
          <p>{words(needsSecond ? 'review.becomes.whenTwo' : 'review.becomes.whenOne', { number })}</p>
          <p>{words('review.becomes.whenDates')}</p>
        </dd>
      </div>
    </dl>
  );
}

/** This place, and those below by what becomes of their lists. */
export function Where({ compared: { name, below } }: { readonly compared: Pick<ComparedEditions, 'name' | 'below'> }): ReactElement {
  const faulty = below.filter(({ meanings }) => !meanings.ok);
  const touched = below.filter(({ meanings }) => changedMeanings(meanings).length > 0);
  const same = below.length - faulty.length - touched.length;
  const named = (places: typeof below): string => sayList(places.map((place) => place.name));
  return (
    <>
      <p>{words('review.becomes.whereHere', { name })}</p>
      {below.length === 0 ? <p>{words('review.becomes.whereNone')}</p> : null}
      {touched.length === 0 ? null : <p>{words('review.becomes.whereBelow', { count: touched.length, places: named(touched) })}</p>}
      {same === 0 ? null : <p>{words('review.becomes.whereSame', { count: same })}</p>}
      {faulty.length === 0 ? null : <p>{words('review.becomes.whereFault', { places: named(faulty) })}</p>}
    </>
  );
}

function Pieces({ compared: { meanings, names, items } }: { readonly compared: ComparedEditions }): ReactElement {
  if (!meanings.ok) return <p>{words('review.becomes.piecesFault')}</p>;
  const changed = changedMeanings(meanings);
  // A rule that is only proposed has no page yet.
  const added = new Set(items.flatMap(({ list, change, id }) => (list === 'rules' && change === 'added' ? [id] : [])));
  return (
    <>
      <p>{words('review.becomes.piecesCount', { count: changed.length })}</p>
      <ul className="becomes">
        {changed.map((meaning) => (
          <li key={meaning.rule}>
            {added.has(meaning.rule) ? (names.rules.get(meaning.rule) ?? meaning.rule) : <RuleLink id={meaning.rule} names={names} />}
            <RuleMeaningWords meaning={meaning} placeNames={names.regions} sides="amendment" />
          </li>
        ))}
      </ul>
    </>
  );
}
