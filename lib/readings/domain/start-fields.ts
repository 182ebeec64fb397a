import type { SheetFields } from './sheet-id';
import { cellField } from './typed-rows';

/** What an empty page holds: lead and cadmium of one piece, as most reports have them. A row without a figure is left out. */
export const START_FIELDS: SheetFields = Object.fromEntries(
  ['Pb', 'Cd'].flatMap((substance, place) => [
    [cellField('readings', 'specimen', place + 1), ['A']],
    [cellField('readings', 'substance', place + 1), [substance]],
    [cellField('readings', 'unit', place + 1), ['mg/L']],
  ]),
);
