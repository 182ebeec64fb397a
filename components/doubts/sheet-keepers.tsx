import type { ReactElement, ReactNode } from 'react';
import { sayPhrases } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

type Props = {
  /** Those who may be named, whoever took it on first standing first. */
  readonly names: readonly string[];
  /** What was just done here. */
  readonly said: string | null;
  /** The button of an editor. */
  readonly children?: ReactNode;
};

/** Who minds a sheet's look-again dates. Nothing where nobody does and the reader cannot. */
export function SheetKeepers({ names, said, children }: Props): ReactElement | null {
  if (names.length === 0 && children === undefined) return null;
  return (
    <div className="mt-4 font-sans text-plain">
      {said === null ? null : (
        <p role="status" className="mb-2">
          {said}
        </p>
      )}
      {names.length === 0 ? null : (
        <p>
          {words('doubts.keepers.label')}: {sayPhrases([...names])}. <span className="text-umber">{words('doubts.keepers.explain')}</span>
        </p>
      )}
      {children === undefined ? null : <div className="not-in-print mt-2">{children}</div>}
    </div>
  );
}
