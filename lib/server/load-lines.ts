import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import type { Edition, EditionHead } from '@/db/rows/edition-row';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import { regionLine, type RegionLine } from '@/lib/regions/domain/line';
import type { Ctx } from './ctx';
import { readEdition } from './sheets';
import type { LoadedLine } from '@/lib/checks/domain/checklist';
import { compileLine, type CompiledLine, type Place } from '@/lib/checks/domain/line';
import { QUESTIONS } from '@/lib/checks/domain/questions';

const BASE = 'care';

export type UnknownRegion = { readonly kind: 'unknown-region'; readonly code: string };

/** The lines of some places as they are read on a day, and the places that are part of another on that day. */
export type LoadedLines = { readonly lines: readonly LoadedLine[]; readonly places: readonly Place[] };

/** Just after the end of that day, in UTC. */
export const endOf = (on: CalendarDate): Date => new Date(Date.parse(`${on}T00:00:00Z`) + 86_400_000);

/**
 * Loads what it takes to judge a piece in these places on that day: for each layer of their lines the edition in use at the
 * end of the day, compiled. A place without a sheet of its own is refused: we know nothing of it.
 */
export async function loadLines(db: Ctx['db'], codes: readonly string[], on: CalendarDate): Promise<Result<LoadedLines, UnknownRegion>> {
  const [memberships, regions] = await Promise.all([listMemberships(db), listRegions(db)]);
  const sheets = new Map(regions.filter((region) => region.edition !== null).map((region) => [region.code, region]));
  const unknown = codes.find((code) => (sheets.get(code)?.kind ?? 'base') === 'base');
  if (unknown !== undefined) return err({ kind: 'unknown-region', code: unknown });

  const places = regions.flatMap(({ code }): Place[] => {
    const { layers } = regionLine(memberships, code, on);
    return layers.length > 1 ? [{ code, line: layers }] : [];
  });
  const lines = codes.map((code) => ({ code, line: regionLine(memberships, code, on) }));
  const wanted = new Set(lines.flatMap(({ line }) => [...line.layers]).filter((code) => sheets.has(code)));
  const heads = await listEditionsInUse(db, [BASE, ...wanted], endOf(on));
  const loaded = lines.map(({ code, line }) => loadLine(db, { code, line, on, places, heads: headsOf(heads, line) }));
  return ok({ lines: await Promise.all(loaded), places });
}

const headsOf = (heads: readonly EditionHead[], line: RegionLine): readonly EditionHead[] =>
  [BASE, ...line.layers].flatMap((layer) => heads.filter(({ region }) => region === layer));

export type LineRequest = {
  readonly code: string;
  readonly line: RegionLine;
  readonly on: CalendarDate;
  readonly places: readonly Place[];
  /** Editions of the base layer and of the line's layers, general to local. */
  readonly heads: readonly Pick<EditionHead, 'region' | 'number' | 'hash'>[];
};

/** One place's line out of given editions. Throws when an edition is missing or does not compile: a published sheet always does. */
export async function loadLine(db: Ctx['db'], request: LineRequest): Promise<LoadedLine> {
  const editions = await Promise.all(request.heads.map(({ region, number }) => readEdition(db, region, number)));
  const found = editions.flatMap((edition, index) => (edition?.hash === request.heads[index]?.hash && edition !== null ? [edition] : []));
  if (found.length < request.heads.length) throw new Error(`An edition that "${request.code}" is read from is missing or was changed`);
  const layers = found.map(({ sheet, number, hash }) => ({ sheet, edition: number, hash }));
  return { code: request.code, line: request.line, layers, compiled: compiledFor(request, found) };
}

const compiled = new Map<string, CompiledLine>();
const LINES = 200;

/** Compiled lines are kept by all that goes into them; the oldest leaves first. */
function compiledFor(request: LineRequest, editions: readonly Edition[]): CompiledLine {
  const { code, line, on, places, heads } = request;
  const key = JSON.stringify([code, on, line, places, heads.map(({ hash }) => hash)]);
  const found = compiled.get(key);
  if (found !== undefined) return found;
  const made = compileLine({
    questions: QUESTIONS,
    layers: editions.map(({ sheet }) => ({ region: sheet.code, rules: sheet.rules, terms: sheet.terms })),
    except: line.except.map(({ rule }) => rule),
    on,
    places,
  });
  if (!made.ok) throw new Error(`The sheets of "${code}" do not compile: ${JSON.stringify(made.error)}`);
  compiled.set(key, made.value);
  const [oldest] = compiled.keys();
  if (compiled.size > LINES && oldest !== undefined) compiled.delete(oldest);
  return made.value;
}
