import type { SheetEntry } from '@/lib/readings/domain/sheet-entry';
import type { SheetFault } from '@/lib/readings/domain/sheet-faults';
import type { SheetFields } from '@/lib/readings/domain/sheet-id';
import { sheetFaultWords } from './sheet-fault-words';

/** What the parts of the form are drawn from: what each field held, how it was read, and what of it is to be mended. */
export type FormView = {
  readonly fields: SheetFields;
  readonly entry: SheetEntry;
  readonly faults: readonly SheetFault[];
};

/** The words beside a field that could not be read. */
export function errorAt({ faults }: Pick<FormView, 'faults'>, field: string): string | undefined {
  const fault = faults.find((one) => one.field === field);
  return fault === undefined ? undefined : sheetFaultWords(fault);
}
