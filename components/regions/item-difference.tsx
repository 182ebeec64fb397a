import type { ReactElement, ReactNode } from 'react';
import { Badge } from '@/components/ui/badge';
import { DataTable, type Column, type Row } from '@/components/ui/data-table';
import type { RuleMeaning } from '@/lib/checks/domain/meaning';
import { words } from '@/lib/kernel/words';
import { bearsOnWhen, type ComparedNames } from '@/lib/regions/domain/compared-editions';
import type { FieldDifference, ItemDifference } from '@/lib/regions/domain/sheet-difference';
import { FieldWords } from './field-words';
import { RuleMeaningWords, type Sides } from './rule-meaning';
import { WordingSide, WordingTogether } from './wording-marks';

type Props = {
  readonly item: ItemDifference;
  /** For a rule: what the change does to it here. Undefined where it was not compared. */
  readonly meaning: RuleMeaning | undefined;
  readonly names: ComparedNames;
  readonly sides: Sides;
};

const COLOURS = { added: 'celadon', withdrawn: 'ash', changed: 'cobalt', moved: 'plain' } as const;

/** One thing that is otherwise: its name, how it changed, the fields that differ, and what the page puts below them. */
export function ItemDifferenceBlock({ children, ...props }: Props & { readonly children?: ReactNode }): ReactElement {
  const { item, names, sides } = props;
  const title = item.list === 'memberships' ? (names.regions.get(item.title) ?? item.title) : item.title;
  // A rule that is only proposed has no page yet.
  const hasPage = item.list === 'rules' && !(sides === 'amendment' && item.change === 'added');
  return (
    <section className="mt-6" id={`${item.list}-${item.id}`.replaceAll(' ', '-')}>
      <h3>
        {hasPage ? <a href={`/rules/${item.id}`}>{title}</a> : title}{' '}
        <Badge colour={COLOURS[item.change]}>{words(`editions.change.${item.change}`)}</Badge>
      </h3>
      <Content {...props} title={title} />
      {children}
    </section>
  );
}

function Content({ title, ...props }: Props & { readonly title: string }): ReactElement {
  const { item, meaning, names, sides } = props;
  if (item.change === 'moved') return <p className="mt-2">{words('editions.movedOnly')}</p>;
  if (item.change === 'changed') {
    return (
      <>
        {item.moved ? <p className="mt-2">{words('editions.movedToo')}</p> : null}
        <ChangedFields {...props} title={title} />
      </>
    );
  }
  return (
    <div className="mt-3 flex flex-col gap-3">
      {meaning === undefined || meaning.kind === 'same' ? null : (
        <RuleMeaningWords meaning={meaning} placeNames={names.regions} sides={sides} />
      )}
      <OneSide item={item} names={names} title={title} />
    </div>
  );
}

type TitledProps = Pick<Props, 'item' | 'names'> & { readonly title: string };

/** Everything that something new or withdrawn says. */
function OneSide({ item, names, title }: TitledProps): ReactElement {
  const caption = words(item.change === 'added' ? 'editions.captionAdded' : 'editions.captionWithdrawn', { title });
  const columns: readonly Column[] = [
    { id: 'field', heading: words('editions.head.field') },
    { id: 'content', heading: words('editions.head.content') },
  ];
  const rows = item.fields.map((field, place): Row => {
    const value = field.kind === 'values' ? (field.after ?? field.before) : null;
    return { id: String(place), cells: { field: fieldName(field, item), content: <FieldWords value={value} names={names} /> } };
  });
  return <DataTable id={tableId(item)} caption={caption} columns={columns} rows={rows} />;
}

/** Long text is read in one piece below the table; all else stands side by side. */
const isLong = ({ field }: FieldDifference): boolean => field === 'text' || field === 'gaps';

function ChangedFields({ title, ...props }: Props & { readonly title: string }): ReactElement {
  const { item, sides } = props;
  const heads = sides === 'editions' ? (['before', 'after'] as const) : (['now', 'proposed'] as const);
  const columns: readonly Column[] = [
    { id: 'field', heading: words('editions.head.field') },
    { id: 'before', heading: words(`editions.head.${heads[0]}`) },
    { id: 'after', heading: words(`editions.head.${heads[1]}`) },
    ...(tellsMeaning(item) ? [{ id: 'means', heading: words('editions.head.means') }] : []),
  ];
  const fields = item.fields.filter((field) => !isLong(field));
  const firstBearing = fields.findIndex(bearsOnWhen);
  const rows = fields.map((field, place): Row => ({
    id: String(place),
    cells: {
      field: fieldName(field, item),
      before: <Side field={field} side="before" names={props.names} />,
      after: <Side field={field} side="after" names={props.names} />,
      means: <Means {...props} field={field} isFirst={place === firstBearing} />,
    },
  }));
  return (
    <>
      {rows.length === 0 ? null : (
        <div className="mt-3">
          <DataTable id={tableId(item)} caption={words('editions.caption', { title })} columns={columns} rows={rows} />
        </div>
      )}
      {item.fields.filter(isLong).map((field) => (
        <div key={field.field} className="mt-4 max-w-text">
          <h4 className="mb-1">{words(`editions.field.${field.field}`)}</h4>
          {field.kind === 'wording' ? <Wording field={field} /> : null}
        </div>
      ))}
    </>
  );
}

const tableId = ({ list, id }: ItemDifference): string => `changes-${list}-${id}`.replaceAll(/[^a-z0-9-]+/gi, '-');
const tellsMeaning = ({ list }: ItemDifference): boolean => list === 'rules' || list === 'terms';

function fieldName({ field, name }: FieldDifference, { list }: ItemDifference): string {
  if (field === 'detail' && name !== null) return name;
  const said = words(`editions.field.${(list === 'terms' ? TERM_FIELDS[field] : undefined) ?? field}`);
  return name === null ? said : words('editions.namedField', { field: said, name });
}

/** Fields that a word has under other names than a rule. */
const TERM_FIELDS: Partial<Record<FieldDifference['field'], 'holds' | 'definition'>> = { when: 'holds', says: 'definition' };

type SideProps = { readonly field: FieldDifference; readonly side: 'before' | 'after'; readonly names: ComparedNames };

function Side({ field, side, names }: SideProps): ReactNode {
  if (field.kind === 'wording')
    return field.difference.kind === 'changed' ? <WordingSide difference={field.difference} side={side} /> : <Wording field={field} />;
  return (
    <>
      <FieldWords value={field[side]} names={names} />
      {field.moved && side === 'after' ? <p className="text-umber">{words('editions.reordered')}</p> : null}
    </>
  );
}

function Wording({ field: { difference } }: { readonly field: Extract<FieldDifference, { readonly kind: 'wording' }> }): ReactElement {
  if (difference.kind === 'changed') return <WordingTogether difference={difference} />;
  return <p>{words(difference.kind === 'layout' ? 'editions.text.layout' : 'editions.text.tooLong')}</p>;
}

type MeansProps = Props & { readonly field: FieldDifference; readonly isFirst: boolean };

/** The meaning stands once a rule, beside the first field that decides when the rule applies. */
function Means({ item, meaning, field, names, sides, isFirst }: MeansProps): ReactElement {
  if (item.list === 'terms') return <>{words(bearsOnWhen(field) ? 'editions.means.term' : 'editions.means.notWhenTerm')}</>;
  if (!bearsOnWhen(field)) return <>{words('editions.means.notWhen')}</>;
  if (!isFirst) return <>{words('editions.means.above')}</>;
  if (meaning === undefined) return <>{words('editions.means.notActive')}</>;
  return <RuleMeaningWords meaning={meaning} placeNames={names.regions} sides={sides} />;
}
