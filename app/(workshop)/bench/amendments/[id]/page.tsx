import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { AddLinks, Changed, Choose, Unfinished } from '@/components/amend/contents';
import { DraftFrame } from '@/components/amend/draft-frame';
import { DraftHead } from '@/components/amend/draft-head';
import { DraftNotices } from '@/components/amend/draft-notices';
import { StalePanel } from '@/components/amend/stale-panel';
import { Decisions, Remarks } from '@/components/amend/talk';
import { words } from '@/lib/kernel/words';
import { LIFE } from '@/lib/regions/domain/amendment';
import type { OwnAmendment } from '@/lib/regions/domain/amendment-view';
import { namesIn } from '@/lib/regions/domain/form-ground';
import { foundItems, itemTitle, listedItems, wholeItems } from '@/lib/regions/domain/listed-items';
import { isItemKey, readItemKey, type ItemKey } from '@/lib/regions/domain/sheet-items';
import { readFormGround } from '@/lib/regions/read-form-ground';
import { freshForm } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { answer, carry, drop, reopen, restore, takeBack, throwAway, withdraw } from '../actions';
import { findDraft } from '../find-draft';
import { freshKey } from '../fresh-key';
import { draftPage, itemPage } from '../item-address';
import { titleOf } from './title-of';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('amend.draft.title'), robots: { index: false } };

export default async function DraftPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { id } = await params;
  const { ctx, draft } = await findDraft(id);
  const query = await searchParams;
  const { amendment, document, changed, entries, stale } = draft;
  const ground = await readFormGround(ctx, document);
  const isOpen = LIFE.save[amendment.state] !== undefined;
  const names = namesIn(ground).regions;
  const items = listedItems(document, names);
  const asked = (one(query, 'q') ?? '').trim().slice(0, 100);
  const nameOf = namer(draft);
  const shared = {
    id,
    pageOf: (item: ItemKey) => itemPage(id, item),
    submission: freshKey,
    acts: { restore, drop, throwAway },
    isOpen,
  };
  const kept = await findKept(one(query, 'look'));
  return (
    <DraftFrame
      title={words('amend.draft.of', { name: draft.name })}
      name={draft.name}
      back="/bench/amendments"
      backText={words('amend.own.title')}
    >
      <DraftNotices
        done={one(query, 'done')}
        saved={titleIn(draft, one(query, 'saved'))}
        why={one(query, 'why')}
        alsoOpen={draft.alsoOpen}
        titleOf={nameOf}
      />
      <DraftHead
        amendment={amendment}
        isOpen={isOpen}
        hidden={{ id }}
        submission={freshKey}
        acts={{ takeBack, withdraw, reopen }}
        page={draftPage(id)}
      />
      {stale === null ? null : (
        <StalePanel
          stale={stale}
          carry={carry}
          hidden={{ key: freshKey(), id }}
          isOpen={LIFE['carry-over'][amendment.state] !== undefined}
        />
      )}
      <Decisions decisions={draft.decisions} />
      <Remarks
        remarks={draft.remarks}
        id={id}
        answer={answer}
        first={(remark) => (kept?.values['remark'] === remark ? kept : freshForm())}
        titleOf={(line) => nameOf(line.split('#')[0] ?? line)}
        busy={formWords().busy}
      />
      {isOpen ? <Unfinished {...shared} entries={entries} titleOf={nameOf} /> : null}
      <Changed {...shared} changed={changed} />
      {isOpen ? (
        <>
          <AddLinks page={draftPage(id)} />
          <Choose
            {...shared}
            page={draftPage(id)}
            asked={asked}
            found={foundItems(items, asked)}
            total={items.length}
            whole={wholeItems()}
          />
        </>
      ) : null}
    </DraftFrame>
  );
}

/** Names items by what they are called in the amendment, what is only typed yet by what was typed. */
const namer =
  ({ document, entries }: OwnAmendment) =>
  (line: string): string => {
    if (!isItemKey(line)) return line;
    const typed = entries.find(({ item }) => item === line);
    const list = readItemKey(line)?.list;
    return typed === undefined || list === undefined ? itemTitle(document, line) : titleOf(list, typed.values, itemTitle(document, line));
  };

const titleIn = (draft: OwnAmendment, saved: string | undefined): string | null =>
  saved !== undefined && isItemKey(saved) ? itemTitle(draft.document, saved) : null;
