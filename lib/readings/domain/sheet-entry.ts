import { readEntry, unknownField } from '@/lib/checks/domain/entry';
import type { Answers } from '@/lib/checks/domain/knowledge';
import { readDecimal } from '@/lib/checks/domain/spoken-answer';
import { parseCalendarDate, type CalendarDate } from '@/lib/kernel/calendar-date';
import { readPasted, rowsOf, type PastedLine } from './pasted-rows';
import { readProfile, type ReadProfile } from './profile-entry';
import type { SheetRow } from './row-words';
import type { SheetFault } from './sheet-faults';
import type { SheetFields } from './sheet-id';
import { cellField, firstOf, ROW_LISTS, typedRows, type RowList } from './typed-rows';

/** What the page asks of a piece: all that a limit can turn on. */
export const PIECE_QUESTIONS = [
  'use',
  'could-hold-food',
  'unfit-by-design',
  'form',
  'holds-liquid',
  'depth-mm',
  'capacity-ml',
  'drinking-rim',
  'rim-decorated',
  'lidded',
  'cooked-in',
  'packaging-or-storage',
  'for-children',
  'inside',
  'outside-glazed',
  'lead-or-cadmium-in-materials',
  'changed-since-test',
  'employees',
] as const;

export const EXTRACT_PARTS = ['vessel', 'lid', 'rim'] as const;
export type ExtractPart = (typeof EXTRACT_PARTS)[number];
export type TypedExtract = { readonly part: ExtractPart; readonly volumeMl: number | null; readonly areaCm2: number | null };

export type TypedConditions = {
  readonly temperatureC?: number;
  readonly hours?: number;
  readonly dark?: boolean;
  readonly hot?: boolean;
};

/** The form of readings as it was understood, and all that was not. */
export type SheetEntry = {
  readonly regions: readonly string[];
  readonly on: CalendarDate | null;
  readonly answers: Answers;
  readonly rows: Readonly<Record<RowList, readonly SheetRow[]>>;
  readonly pasted: Readonly<Record<RowList, readonly PastedLine[]>>;
  readonly extracts: readonly TypedExtract[];
  readonly conditions: TypedConditions;
  readonly profile: ReadProfile;
  readonly faults: readonly SheetFault[];
};

export const pastedField = (list: RowList): string => `${list}.pasted`;
export const volumeField = (part: ExtractPart): string => `volume-${part}`;
export const areaField = (part: ExtractPart): string => `area-${part}`;

/** Reads the whole form. An empty field is not known; it is neither "no" nor zero. */
export function readSheetEntry(fields: SheetFields): SheetEntry {
  const piece = pieceOf(fields);
  const profile = readProfile(fields);
  const lists = { readings: listOf(fields, 'readings'), further: listOf(fields, 'further') };
  const extracts = numbersOf(
    fields,
    EXTRACT_PARTS.flatMap((part) => [volumeField(part), areaField(part)]),
    'extract',
  );
  const amounts = numbersOf(fields, ['temperature', 'hours'], 'condition');
  const regions = fields['region'] ?? [];
  const day = firstOf(fields, 'on').trim();
  const on = day === '' ? null : parseCalendarDate(day);
  return {
    regions,
    on,
    answers: { ...piece.answers, ...profile.answers },
    rows: { readings: lists.readings.rows, further: lists.further.rows },
    pasted: { readings: lists.readings.pasted, further: lists.further.pasted },
    extracts: EXTRACT_PARTS.flatMap((part) => extractOf(part, extracts.values)),
    conditions: conditionsOf(fields, amounts.values),
    profile,
    faults: [
      ...(regions.length === 0 ? [fault('region', 'places', 'none-chosen')] : []),
      ...(day !== '' && on === null ? [fault('on', 'day', 'bad-day')] : []),
      ...piece.faults,
      ...profile.faults,
      ...ROW_LISTS.flatMap((list) => lists[list].faults),
      ...emptyFault(lists.readings),
      ...extracts.faults,
      ...amounts.faults,
    ],
  };
}

const fault = (field: string, place: SheetFault['place'], why: SheetFault['why']): SheetFault => ({ field, place, why });

function pieceOf(fields: SheetFields): { readonly answers: Answers; readonly faults: readonly SheetFault[] } {
  const said = PIECE_QUESTIONS.filter((id) => firstOf(fields, id).trim() !== '' || firstOf(fields, unknownField(id)) !== '');
  const read = readEntry(said, fields);
  if (read.ok) return { answers: read.value.answers, faults: [] };
  const faults = read.error.flatMap(({ question, field, why }): readonly SheetFault[] =>
    why === 'nothing-said' ? [] : [{ field, place: 'piece', why, name: question }],
  );
  return { answers: {}, faults };
}

type ReadList = { readonly rows: readonly SheetRow[]; readonly pasted: readonly PastedLine[]; readonly faults: readonly SheetFault[] };

function listOf(fields: SheetFields, list: RowList): ReadList {
  const typed = typedRows(fields, list);
  const pasted = readPasted(firstOf(fields, pastedField(list)));
  const at = [
    ...typed.flatMap(({ row, read }) => (read.ok ? [{ said: read.value, field: cellField(list, 'specimen', row), row }] : [])),
    ...pasted.flatMap((one) => (one.kind === 'understood' ? [{ said: one.row, field: pastedField(list), line: one.line }] : [])),
  ];
  const twice = at.filter(({ said }, place) => at.findIndex((one) => keyOf(one.said) === keyOf(said)) < place);
  return {
    rows: [...typed.flatMap(({ read }) => (read.ok ? [read.value] : [])), ...rowsOf(pasted)],
    pasted,
    faults: [
      ...typed.flatMap(({ row, read }): readonly SheetFault[] =>
        read.ok ? [] : [{ field: cellField(list, read.error.column, row), place: list, why: read.error.why, row }],
      ),
      ...pasted.flatMap((one): readonly SheetFault[] =>
        one.kind === 'not-understood' ? [{ field: pastedField(list), place: list, why: one.why, line: one.line }] : [],
      ),
      ...twice.map(({ said, ...where }): SheetFault => ({ ...where, place: list, why: 'twice', name: said.specimen })),
    ],
  };
}

/** Specimen, substance and part: a list holds each at most once. */
const keyOf = ({ specimen, substance, part }: SheetRow): string => JSON.stringify([specimen, substance, part]);

const emptyFault = ({ rows, faults }: ReadList): readonly SheetFault[] =>
  rows.length === 0 && faults.length === 0 ? [fault(cellField('readings', 'value', 1), 'readings', 'no-readings')] : [];

type Numbers = { readonly values: Readonly<Record<string, number>>; readonly faults: readonly SheetFault[] };

function numbersOf(fields: SheetFields, names: readonly string[], place: 'extract' | 'condition'): Numbers {
  const read = names.flatMap((name) => {
    const typed = firstOf(fields, name);
    return typed.trim() === '' ? [] : [{ name, number: readDecimal(typed) }];
  });
  return {
    values: Object.fromEntries(read.flatMap(({ name, number }) => (number.ok ? [[name, Number(number.value)]] : []))),
    faults: read.flatMap(({ name, number }): readonly SheetFault[] => (number.ok ? [] : [{ field: name, place, why: number.error, name }])),
  };
}

function extractOf(part: ExtractPart, values: Numbers['values']): readonly TypedExtract[] {
  const [volumeMl, areaCm2] = [values[volumeField(part)] ?? null, values[areaField(part)] ?? null];
  return volumeMl === null && areaCm2 === null ? [] : [{ part, volumeMl, areaCm2 }];
}

function conditionsOf(fields: SheetFields, values: Numbers['values']): TypedConditions {
  const [temperatureC, hours] = [values['temperature'], values['hours']];
  const [dark, hot] = [yesNo(firstOf(fields, 'dark')), yesNo(firstOf(fields, 'hot'))];
  return {
    ...(temperatureC === undefined ? {} : { temperatureC }),
    ...(hours === undefined ? {} : { hours }),
    ...(dark === null ? {} : { dark }),
    ...(hot === null ? {} : { hot }),
  };
}

const yesNo = (typed: string): boolean | null => (typed === 'yes' ? true : typed === 'no' ? false : null);
