import type { Misread } from '@/lib/checks/domain/spoken-answer';
import type { ProfileFault } from '@/lib/pieces/domain/vessel';
import type { RowFault } from './row-words';

/** Where on the form something cannot be read. */
export type FaultPlace = 'places' | 'day' | 'piece' | 'profile' | 'readings' | 'further' | 'extract' | 'condition';

export type SheetFaultWhy =
  | Misread
  | RowFault
  | 'columns'
  | 'too-many'
  | 'twice'
  | 'none-chosen'
  | 'unknown-place'
  | 'bad-day'
  | 'no-readings'
  | 'half-point'
  | ProfileFault['kind']
  | 'no-profile'
  | 'refused';

/** One thing to mend: the field it belongs to, where that is, and why. `said` is a sentence of the API's own, where it refused. */
export type SheetFault = {
  readonly field: string;
  readonly place: FaultPlace;
  readonly why: SheetFaultWhy;
  readonly row?: number;
  readonly line?: number;
  readonly name?: string;
  readonly said?: string;
};

/** What to mend at once. Who asked for a drawing, a preview or more rows is not told yet what else is missing. */
export function shownFaults(faults: readonly SheetFault[], act: string): readonly SheetFault[] {
  if (act === '') return faults;
  if (act === 'draw') return faults.filter(({ place }) => place === 'profile');
  return act === 'preview' ? faults.filter(({ line }) => line !== undefined) : [];
}
