import type { ReactElement } from 'react';
import { Panel } from '@/components/ui/panel';
import type { StatusChange } from '@/lib/checks/domain/status-change';
import { words } from '@/lib/kernel/words';

/** Lines whose status changed, each with before and after in words. */
export function ChangeList({ changes }: { readonly changes: readonly StatusChange[] }): ReactElement {
  const say = (status: StatusChange['before']): string =>
    status === null ? words('checks.result.absent') : words(`site.states.${status}`);
  return (
    <ul className="list-disc ps-6">
      {changes.map(({ region, rule, title, before, after }) => (
        <li key={`${region}-${rule}`}>
          <a href={`/rules/${rule}`}>{title}</a>: {words('checks.result.change', { before: say(before), after: say(after) })}
        </li>
      ))}
    </ul>
  );
}

const APPLYING: readonly (string | null)[] = ['applies', 'treat-as-applying', 'sources-disagree'];

/** R5: what an answer changed in the list, counted in a status region and listed. */
export function ChangesPanel({ changes }: { readonly changes: readonly StatusChange[] | null }): ReactElement | null {
  if (changes === null) return null;
  const added = changes.filter(({ before, after }) => APPLYING.includes(after) && !APPLYING.includes(before)).length;
  const gone = changes.filter(({ before, after }) => APPLYING.includes(before) && !APPLYING.includes(after)).length;
  const other = changes.length - added - gone;
  return (
    <div className="mt-6">
      <Panel colour="cobalt" label={words('checks.result.changed')}>
        <p role="status">
          {words('checks.result.changed')}:{' '}
          {changes.length === 0 ? words('checks.result.changedNone') : words('checks.result.changedCount', { added, gone, other })}
        </p>
        {changes.length === 0 ? null : (
          <details className="disclosure">
            <summary>{words('checks.result.changedList')}</summary>
            <ChangeList changes={changes} />
          </details>
        )}
      </Panel>
    </div>
  );
}
