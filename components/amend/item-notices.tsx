import type { ReactElement } from 'react';
import { Note } from '@/components/accounts/note';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import type { Entry } from '@/lib/regions/domain/entry';
import { HiddenFields } from './hidden-fields';

type Props = {
  readonly why: string | undefined;
  readonly isKept: boolean;
  readonly isAttached: boolean;
  readonly isUnsaved: boolean;
  readonly theirs: Entry | null;
  readonly mine: Entry;
  readonly throwAway: (form: FormData) => Promise<void>;
  readonly hidden: Readonly<Record<string, string>>;
};

/** What is to be known before one goes on typing. */
export function ItemNotices({ why, isKept, isAttached, isUnsaved, theirs, mine, throwAway, hidden }: Props): ReactElement {
  return (
    <div className="mt-4 flex max-w-text flex-col gap-4">
      <Refused why={why} />
      {theirs === null ? null : <Theirs theirs={theirs} mine={mine} />}
      {isAttached ? <Note>{words('amend.source.attached')}</Note> : null}
      {isUnsaved && theirs === null ? (
        <Panel colour="ash">
          <p role={isKept ? 'status' : undefined}>{words('amend.form.unsaved')}</p>
          <form action={throwAway} className="mt-2">
            <HiddenFields values={hidden} />
            <button type="submit" className="button button-plain">
              {words('amend.form.throwAway')}
            </button>
          </form>
        </Panel>
      ) : null}
    </div>
  );
}

function Refused({ why }: Pick<Props, 'why'>): ReactElement | null {
  if (why !== 'busy' && why !== 'key-reused' && why !== 'too-much') return null;
  return (
    <Panel colour="copper">
      <p>{words(`amend.refused.${why}`)}</p>
    </Panel>
  );
}

const textOf = (value: Entry[string] | undefined): string => [value ?? ''].flat().join(', ');

/** What another tab kept, field by field, where it differs from what is in the form below. */
function Theirs({ theirs, mine }: { readonly theirs: Entry; readonly mine: Entry }): ReactElement {
  const names = [...new Set([...Object.keys(theirs), ...Object.keys(mine)])].filter((name) => textOf(theirs[name]) !== textOf(mine[name]));
  return (
    <Panel colour="copper">
      <h2>{words('amend.keep.bothTitle')}</h2>
      <p className="mt-2">{words('amend.keep.both')}</p>
      <dl className="mt-2 font-sans text-plain">
        {names.map((name) => (
          <div key={name} className="mt-2">
            <dt className="font-strong">{name}</dt>
            <dd>
              {words('amend.keep.theirs')} {textOf(theirs[name])}
            </dd>
          </div>
        ))}
      </dl>
    </Panel>
  );
}
