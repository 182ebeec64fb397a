import { readDecimal } from '@/lib/checks/domain/spoken-answer';
import { measuredAnswers, type MeasuredAnswers } from '@/lib/pieces/domain/measured-answers';
import type { Point } from '@/lib/pieces/domain/section';
import { readVessel, type Vessel } from '@/lib/pieces/domain/vessel';
import type { SheetFault } from './sheet-faults';
import type { SheetFields } from './sheet-id';
import { firstOf } from './typed-rows';

/** Points one can type, from the middle of the inside up to the rim. */
export const PROFILE_POINTS = 12;
export const SPILL_FIELD = 'profile.spill';
export const USE_PROFILE = 'profile.use';

export const radiusField = (point: number): string => `profile.radius.${String(point)}`;
export const heightField = (point: number): string => `profile.height.${String(point)}`;

/** The profile as it was typed. `vessel` and `measured` are null where nothing was drawn, or not so that it can be read. */
export type ReadProfile = {
  readonly vessel: Vessel | null;
  readonly measured: MeasuredAnswers | null;
  /** What the profile answers of the piece: nothing, unless the maker has seen the measures and said to use them. */
  readonly answers: Partial<MeasuredAnswers>;
  readonly faults: readonly SheetFault[];
};

type TypedPoint = { readonly number: number; readonly point: Point | null; readonly faults: readonly SheetFault[] };

/** Reads the table of points. A row with neither radius nor height is no point; half a point is refused. */
export function readProfile(fields: SheetFields): ReadProfile {
  const typed = Array.from({ length: PROFILE_POINTS }, (_, place) => typedPoint(fields, place + 1)).filter((one) => one !== null);
  const spill = numberIn(fields, SPILL_FIELD);
  const faults = [...typed.flatMap((one) => one.faults), ...[spill.fault].filter((fault) => fault !== null)];
  const isUsed = firstOf(fields, USE_PROFILE) !== '';
  if (faults.length > 0) return unread(faults);
  return typed.length === 0 ? unread(isUsed ? [noProfile] : []) : drawn(typed, spill.value ?? 0, isUsed ? 'used' : 'shown');
}

function drawn(typed: readonly TypedPoint[], spillsBelowRimMm: number, measures: 'used' | 'shown'): ReadProfile {
  const points = typed.flatMap(({ point }) => (point === null ? [] : [point]));
  const vessel = readVessel({ points, spillsBelowRimMm });
  if (!vessel.ok) return unread([profileFault(vessel.error, typed)]);
  const measured = measuredAnswers(vessel.value, []);
  return { vessel: vessel.value, measured, answers: measures === 'used' ? measured : {}, faults: [] };
}

const unread = (faults: readonly SheetFault[]): ReadProfile => ({ vessel: null, measured: null, answers: {}, faults });

const noProfile: SheetFault = { field: radiusField(1), place: 'profile', why: 'no-profile' };

function typedPoint(fields: SheetFields, number: number): TypedPoint | null {
  const [radius, height] = [numberIn(fields, radiusField(number)), numberIn(fields, heightField(number))];
  if (radius.isEmpty && height.isEmpty) return null;
  if (radius.isEmpty || height.isEmpty) {
    const field = radius.isEmpty ? radiusField(number) : heightField(number);
    return { number, point: null, faults: [{ field, place: 'profile', why: 'half-point', row: number }] };
  }
  const faults = [radius.fault, height.fault].flatMap((fault) => (fault === null ? [] : [{ ...fault, row: number }]));
  const isRead = radius.value !== null && height.value !== null;
  return { number, point: isRead ? [radius.value, height.value] : null, faults };
}

type Typed = { readonly isEmpty: boolean; readonly value: number | null; readonly fault: SheetFault | null };

function numberIn(fields: SheetFields, field: string): Typed {
  const typed = firstOf(fields, field).trim();
  if (typed === '') return { isEmpty: true, value: null, fault: null };
  // A height may lie below the table's zero, as the middle of a sunken floor does.
  const isNegative = /^[-−]/.test(typed);
  const read = readDecimal(typed.replace(/^[-−]/, ''));
  if (!read.ok) return { isEmpty: false, value: null, fault: { field, place: 'profile', why: read.error } };
  return { isEmpty: false, value: Number(read.value) * (isNegative ? -1 : 1), fault: null };
}

type Refusal = Extract<ReturnType<typeof readVessel>, { readonly ok: false }>['error'];

function profileFault(refusal: Refusal, typed: readonly TypedPoint[]): SheetFault {
  const number = 'at' in refusal ? (typed[refusal.at]?.number ?? 1) : 1;
  const field = refusal.kind === 'bad-spill' || refusal.kind === 'spill-below-floor' ? SPILL_FIELD : radiusField(number);
  return { field, place: 'profile', why: refusal.kind, row: number };
}
