import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { formWords, one, type Query } from '@/app/(account)/form-words';
import { EntryForm } from '@/components/accounts/entry-form';
import { DraftFrame } from '@/components/amend/draft-frame';
import { FindingList } from '@/components/amend/finding-list';
import { PlacesBelow, SheetDifferences, UneditedRules } from '@/components/regions/editions-comparison';
import { TrialChanges } from '@/components/regions/trial-changes';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import { checkDraft } from '@/lib/regions/check-draft';
import { LIFE } from '@/lib/regions/domain/amendment';
import type { CheckedAmendment, OwnAmendment } from '@/lib/regions/domain/amendment-view';
import { changedUnedited } from '@/lib/regions/domain/compared-editions';
import { freshForm, type FormState } from '@/lib/server/define-action';
import { findKept } from '@/lib/server/kept-form';
import { send } from '../../actions';
import { findDraft } from '../../find-draft';
import { draftPage } from '../../item-address';

type Props = { readonly params: Promise<{ readonly id: string }>; readonly searchParams: Promise<Query> };

export const metadata: Metadata = { title: words('amend.check.title'), robots: { index: false } };

export default async function CheckPage({ params, searchParams }: Props): Promise<ReactElement> {
  const { id } = await params;
  const { ctx, draft } = await findDraft(id);
  const checked = await checkDraft(ctx, { id });
  if (!checked.ok) notFound();
  const { findings, comparison } = checked.value;
  const { items, meanings, below, trials, names } = comparison;
  const kept = await findKept(one(await searchParams, 'look'));
  const errors = findings.filter(({ level }) => level === 'error');
  return (
    <DraftFrame title={words('amend.check.title')} name={draft.name} back={draftPage(id)}>
      <p className="mt-4 max-w-text">{words('amend.check.lead')}</p>
      <Before draft={draft} errors={errors.length} />
      <FindingList findings={findings} page={draftPage(id)} contacts={draft.document} />
      <h2 className="mt-8">{words('amend.check.changes')}</h2>
      {items.length === 0 ? <p className="mt-2">{words('amend.refused.nothing-changed')}</p> : null}
      <SheetDifferences items={items} meanings={meanings.ok ? meanings.value : []} names={names} sides="amendment" />
      {meanings.ok ? null : <p className="mt-4">{words('editions.means.fault')}</p>}
      <UneditedRules meanings={changedUnedited(meanings, items)} names={names} sides="amendment" />
      <PlacesBelow below={below} names={names} sides="amendment" />
      <TrialChanges trials={trials} names={names} sides="amendment" />
      {LIFE.send[draft.amendment.state] === undefined ? (
        <p className="mt-8">{words(`amend.means.${draft.amendment.state}`)}</p>
      ) : (
        <SendForm draft={draft} trials={trials} kept={kept} />
      )}
    </DraftFrame>
  );
}

/** What stands in the way of sending, before anything else. */
function Before({ draft, errors }: { readonly draft: OwnAmendment; readonly errors: number }): ReactElement | null {
  const { entries, stale, changed } = draft;
  const said = [
    ...(entries.length === 0 ? [] : [words('amend.refused.unfinished', { count: entries.length })]),
    ...(stale === null ? [] : [words('amend.refused.stale')]),
    ...(changed.length === 0 ? [words('amend.refused.nothing-changed')] : []),
    ...(errors === 0 ? [] : [words('amend.refused.findings', { count: errors })]),
  ];
  if (said.length === 0) return null;
  return (
    <div className="mt-6 max-w-text">
      <Panel colour="ash">
        <h2>{words('amend.check.before')}</h2>
        <ul className="mt-2 list-disc ps-6">
          {said.map((one) => (
            <li key={one}>{one}</li>
          ))}
        </ul>
      </Panel>
    </div>
  );
}

type SendProps = {
  readonly draft: OwnAmendment;
  readonly trials: CheckedAmendment['comparison']['trials'];
  readonly kept: FormState | null;
};

function SendForm({ draft: { amendment }, trials, kept }: SendProps): ReactElement {
  const said = Object.fromEntries(Object.entries(amendment.intended).map(([trial, why]) => [`intended.${trial}`, why]));
  return (
    <section className="amend-section max-w-text" aria-labelledby="send">
      <h2 id="send" className="mb-4">
        {words('amend.check.send')}
      </h2>
      <EntryForm
        action={send}
        first={kept ?? freshForm({ summary: amendment.summary, ...said })}
        {...formWords()}
        hidden={{ id: amendment.id, version: String(amendment.version) }}
        submit={words('amend.check.button')}
        fields={[
          ...trials.changed.map(({ id, title }) => ({
            name: `intended.${id}`,
            type: 'long-text' as const,
            label: words('amend.check.intended', { title }),
            hint: words('amend.check.intendedHint'),
          })),
          { name: 'summary', type: 'long-text' as const, label: words('amend.check.summary'), hint: words('amend.check.summaryHint') },
        ]}
      />
    </section>
  );
}
