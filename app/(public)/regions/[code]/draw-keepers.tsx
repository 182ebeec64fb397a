import type { ReactElement } from 'react';
import { become, stop } from '@/app/(desk)/look-again/actions';
import { KeeperButton } from '@/components/doubts/keeper-button';
import { saidName } from '@/components/doubts/said-name';
import { SheetKeepers } from '@/components/doubts/sheet-keepers';
import { can } from '@/lib/access/domain/policy';
import { words } from '@/lib/kernel/words';
import { listKeepers } from '@/lib/regions/list-keepers';
import { makeCtx } from '@/lib/server/ctx';
import { freshForm } from '@/lib/server/define-action';
import { currentActor } from '@/lib/server/session';

type Query = Readonly<Record<string, string | string[] | undefined>>;

/** Who keeps a sheet, and for editors the button to begin or stop. */
export async function drawKeepers(place: { readonly code: string; readonly name: string }, { done, why }: Query): Promise<ReactElement> {
  const [keepers, actor] = await Promise.all([listKeepers(makeCtx(), place.code), currentActor()]);
  const names = [...new Set(keepers.map(({ said }) => saidName(said)))];
  const told = saidOf(place.name, done, why);
  if (actor.kind !== 'account' || !can(actor, 'sheet.keep')) return <SheetKeepers names={names} said={null} />;
  const isKept = keepers.some(({ accountId }) => accountId === actor.id);
  return (
    <SheetKeepers names={names} said={told}>
      <KeeperButton place={place} isKept={isKept} formKey={freshForm().key} back="sheet" become={become} stop={stop} />
    </SheetKeepers>
  );
}

function saidOf(place: string, done: Query[string], why: Query[string]): string | null {
  const kind = (['took', 'gave'] as const).find((one) => one === done);
  if (kind !== undefined) return words(`doubts.keepers.done.${kind}`, { place });
  return why === 'refused' ? words('doubts.keepers.refused') : null;
}
