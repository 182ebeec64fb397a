import type { ReactElement } from 'react';
import { Badge } from '@/components/ui/badge';
import { sayInstant } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { DraftEntry, OwnAmendment } from '@/lib/regions/domain/amendment-view';
import type { ListedItem } from '@/lib/regions/domain/listed-items';
import { ITEM_LISTS, readItemKey, type ItemKey } from '@/lib/regions/domain/sheet-items';
import { PressButton } from './press-button';

type Act = (form: FormData) => Promise<void>;
export type Acts = { readonly restore: Act; readonly drop: Act; readonly throwAway: Act };

type Shared = {
  readonly id: string;
  readonly pageOf: (item: ItemKey) => string;
  /** A key for one more form. */
  readonly submission: () => string;
  readonly acts: Acts;
  readonly isOpen: boolean;
};

type EntriesProps = Shared & { readonly entries: readonly DraftEntry[]; readonly titleOf: (item: ItemKey) => string };

/** What was typed and not saved: it comes first, since nothing can be sent before it is. */
export function Unfinished({ entries, titleOf, id, pageOf, submission, acts }: EntriesProps): ReactElement | null {
  if (entries.length === 0) return null;
  return (
    <section className="amend-section" aria-labelledby="unfinished">
      <h2 id="unfinished">{words('amend.draft.unfinished')}</h2>
      <p className="mt-2 max-w-text">{words('amend.draft.unfinishedLead')}</p>
      <ul className="mt-3" role="list">
        {entries.map(({ item, savedAt }) => (
          <li key={item} className="amend-item">
            <div>
              <a href={pageOf(item)} className="font-strong">
                {titleOf(item)}
              </a>
              <p className="font-sans text-plain text-umber">{words('amend.draft.keptAt', { at: sayInstant(savedAt) })}</p>
            </div>
            <PressButton action={acts.throwAway} hidden={{ key: submission(), id, item }} about={titleOf(item)}>
              {words('amend.form.throwAway')}
            </PressButton>
          </li>
        ))}
      </ul>
    </section>
  );
}

const COLOURS = { added: 'celadon', withdrawn: 'ash', changed: 'cobalt' } as const;

type ChangedProps = Shared & { readonly changed: OwnAmendment['changed'] };

/** What differs from the sheet in use. */
export function Changed({ changed, id, pageOf, submission, acts, isOpen }: ChangedProps): ReactElement {
  return (
    <section className="amend-section" aria-labelledby="changed">
      <h2 id="changed">{words('amend.draft.changed')}</h2>
      {changed.length === 0 ? <p className="mt-2 max-w-text">{words('amend.draft.changedNone')}</p> : null}
      <ul className="mt-3" role="list">
        {changed.map(({ item, title, change }) => (
          <li key={item} className="amend-item">
            <div>
              {change === 'withdrawn' || !isOpen ? <span className="font-strong">{title}</span> : <a href={pageOf(item)}>{title}</a>}{' '}
              <Badge colour={COLOURS[change]}>{words(`editions.change.${change}`)}</Badge>
              <p className="font-sans text-plain text-umber">{words(`amend.list.one.${readItemKey(item)?.list ?? 'place'}`)}</p>
            </div>
            {isOpen ? (
              <div className="flex flex-wrap gap-3">
                {change === 'withdrawn' ? null : (
                  <a className="button button-plain" href={pageOf(item)}>
                    {words('amend.draft.mend')}
                    <span className="sr-only">: {title}</span>
                  </a>
                )}
                <PressButton action={acts.restore} hidden={{ key: submission(), id, item }} about={title}>
                  {words(change === 'added' ? 'amend.draft.takeOut' : 'amend.draft.asItWas')}
                </PressButton>
              </div>
            ) : null}
          </li>
        ))}
      </ul>
    </section>
  );
}

/** Ways to something new. */
export function AddLinks({ page }: { readonly page: string }): ReactElement {
  return (
    <section className="amend-section" aria-labelledby="add">
      <h2 id="add">{words('amend.draft.add')}</h2>
      <ul className="mt-3 flex flex-wrap gap-3" role="list">
        {ITEM_LISTS.map((list) => (
          <li key={list}>
            <a className="button button-plain" href={`${page}/${list}/new`}>
              {words(`amend.new.title.${list}`)}
            </a>
          </li>
        ))}
      </ul>
    </section>
  );
}

type ChooseProps = Shared & {
  readonly page: string;
  readonly asked: string;
  readonly found: readonly ListedItem[];
  readonly total: number;
  readonly whole: readonly ItemKey[];
};

/** What is in the sheet, to choose from. */
export function Choose({ page, asked, found, total, whole, id, pageOf, submission, acts }: ChooseProps): ReactElement {
  return (
    <section className="amend-section" aria-labelledby="choose">
      <h2 id="choose">{words('amend.draft.choose')}</h2>
      <ul className="mt-3 flex flex-wrap gap-x-6" role="list">
        {whole.map((item) => (
          <li key={item} className="py-1">
            <a href={pageOf(item)}>
              {words(`amend.draft.whole.${readItemKey(item)?.list === 'text' ? 'text' : item === 'gaps' ? 'gaps' : 'place'}`)}
            </a>
          </li>
        ))}
      </ul>
      <form action={page} method="get" role="search" className="amend-row mt-4">
        <div className="flex flex-col gap-1">
          <label htmlFor="q" className="font-sans text-plain font-strong">
            {words('amend.draft.find')}
          </label>
          <input id="q" type="search" name="q" className="control" defaultValue={asked} />
        </div>
        <button type="submit" className="button button-plain">
          {words('amend.draft.findButton')}
        </button>
      </form>
      <p className="mt-3 font-sans text-plain" role="status">
        {words('amend.draft.count', { found: found.length, total })}{' '}
        {asked === '' ? null : <a href={`${page}#choose`}>{words('amend.draft.showAll')}</a>}
      </p>
      {ITEM_LISTS.map((list) => {
        const own = found.filter((one) => one.list === list);
        return own.length === 0 ? null : (
          <details key={list} className="disclosure" open={asked !== '' || own.length <= 12}>
            <summary>{words('amend.draft.listOf', { name: words(`amend.list.many.${list}`), count: own.length })}</summary>
            <ul role="list">
              {own.map(({ item, title }) => (
                <li key={item} className="amend-item">
                  <a href={pageOf(item)}>{title}</a>
                  <PressButton action={acts.drop} hidden={{ key: submission(), id, item }} about={title}>
                    {words('amend.draft.drop')}
                  </PressButton>
                </li>
              ))}
            </ul>
          </details>
        );
      })}
    </section>
  );
}
