import { readdirSync, readFileSync } from 'node:fs';
import { parsePlacesFile, parseSheetFile } from '@/content/seed/sheet-file';
import type { LoadedLine } from '@/lib/checks/domain/checklist';
import { compileLine, type Place } from '@/lib/checks/domain/line';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { parseCalendarDate, type CalendarDate } from '@/lib/kernel/calendar-date';
import { regionLine } from '@/lib/regions/domain/line';
import type { Sheet } from '@/lib/regions/domain/sheet';

const FOLDER = new URL('../../content/seed/', import.meta.url);
const text = (path: string): string => readFileSync(new URL(path, FOLDER), 'utf8');

/** Every seed sheet, by code. Throws with the faults of a file that does not parse. */
export const seedSheets: ReadonlyMap<string, Sheet> = new Map(
  readdirSync(new URL('regions/', FOLDER)).map((name) => {
    const sheet = parseSheetFile(name, text(`regions/${name}`));
    if (!sheet.ok) throw new Error(sheet.error.join('\n'));
    return [sheet.value.code, sheet.value];
  }),
);

const places = parsePlacesFile('places.json', text('places.json'));
if (!places.ok) throw new Error(places.error.join('\n'));

const memberships = new Map([
  ...places.value.map(({ code, memberships: edges }) => [code, edges] as const),
  ...[...seedSheets.values()].map(({ code, memberships: edges }) => [code, edges] as const),
]);

/** A date known to be one. */
export function aDate(date: string): CalendarDate {
  const parsed = parseCalendarDate(date);
  if (parsed === null) throw new Error(`${date} is no date`);
  return parsed;
}

/** A place's line out of the seed sheets as read on a day, compiled as the site does. */
export function seedLine(code: string, on: CalendarDate): LoadedLine {
  const line = regionLine(memberships, code, on);
  const layers = ['care', ...line.layers].flatMap((layer) => seedSheets.get(layer) ?? []);
  const known: Place[] = [...memberships.keys()].flatMap((place) => {
    const { layers: own } = regionLine(memberships, place, on);
    return own.length > 1 ? [{ code: place, line: own }] : [];
  });
  const compiled = compileLine({
    questions: QUESTIONS,
    layers: layers.map((sheet) => ({ region: sheet.code, rules: sheet.rules, terms: sheet.terms })),
    except: line.except.map(({ rule }) => rule),
    on,
    places: known,
  });
  if (!compiled.ok) throw new Error(`${code}: ${JSON.stringify(compiled.error)}`);
  return { code, line, layers: layers.map((sheet) => ({ sheet, edition: 1, hash: 'seed' })), compiled: compiled.value };
}
