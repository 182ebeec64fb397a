import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import type { RegionHead } from '@/db/rows/region-row';
import { bothLines, type BothLines } from '@/lib/checks/domain/compiled-days';
import { compareMeaning } from '@/lib/checks/domain/meaning';
import { isChanged, regionsBelow, worldAfter, worldBefore, type Proposal } from '@/lib/checks/domain/proposal-lines';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { compareTrials } from '@/lib/checks/domain/trial-comparison';
import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { ok } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { endOf } from '@/lib/server/load-lines';
import { readEdition } from '@/lib/server/sheets';
import type { ComparedEdition, ComparedEditions, ComparedNames, LineMeanings } from './domain/compared-editions';
import { regionLine, type Memberships } from './domain/line';
import { isInForce } from './domain/rule';
import type { Sheet } from './domain/sheet';
import { sheetDifference } from './domain/sheet-difference';
import { emptySheet } from './domain/sheet-items';

/** One version of a sheet: an edition, or a document that is proposed. `hash` is that of its document. */
export type Version = { readonly head: ComparedEdition; readonly sheet: Sheet; readonly hash: string };

export type VersionChoice = {
  /** Null where there was no sheet before. */
  readonly before: Version | null;
  readonly after: Version;
  /** The day for which meanings are compared. */
  readonly on: CalendarDate;
};

/**
 * Compares two versions of a sheet. Meanings are those on one day, with the other layers in the edition in use at its end and with
 * the memberships that each version itself gives the place.
 */
export async function compareSheets(ctx: Ctx, choice: VersionChoice): Promise<ComparedEditions> {
  const { before, after, on } = choice;
  const loaded = await load(ctx, { before: before?.sheet ?? null, after: after.sheet, on });
  const key = JSON.stringify([before?.hash ?? null, after.hash, on, loaded.key]);
  const found = kept.get(key) ?? compare(loaded, choice);
  keepFound(key, found);
  return { ...found, from: before?.head ?? { number: 0, summary: '', inUseFrom: ctx.now }, to: after.head };
}

type Found = Omit<ComparedEditions, 'from' | 'to'>;

/** Comparisons are kept by all that goes into them; a sheet with many places below takes a while. */
const kept = new Map<string, Found>();
const COMPARISONS = 40;

function keepFound(key: string, found: Found): void {
  kept.set(key, found);
  const [oldest] = kept.keys();
  if (kept.size > COMPARISONS && oldest !== undefined) kept.delete(oldest);
}

function compare({ proposal, names }: Loaded, { before, after }: VersionChoice): Found {
  const lines = bothLines(proposal);
  const { code, name, kind } = after.sheet;
  const was = before?.sheet ?? emptySheet(code, '', kind);
  return {
    code,
    name,
    on: proposal.on,
    items: sheetDifference(was, after.sheet),
    meanings: meaningsIn(proposal, lines, code),
    below: regionsBelow(proposal, [proposal.on]).map((below) => ({
      code: below,
      name: names.get(below) ?? below,
      meanings: meaningsIn(proposal, lines, below),
    })),
    trials: compareTrials({ before: was, after: after.sheet }, lines, QUESTIONS),
    names: namesIn(proposal, names),
  };
}

/** Where no rule, term or membership is otherwise, no meaning is. */
const meaningsIn = (proposal: Proposal, { before, after }: BothLines, code: string): LineMeanings =>
  isChanged(proposal) ? compareMeaning({ before: before.input(code, proposal.on), after: after.input(code, proposal.on) }) : ok([]);

type Compared = { readonly before: Sheet | null; readonly after: Sheet; readonly on: CalendarDate };
/** `key` is another for other sheets, other memberships or other names of places. */
type Loaded = { readonly proposal: Proposal; readonly names: ReadonlyMap<string, string>; readonly key: string };

/** Both editions among the sheets that they are read with: the layers above, and every place below with all of its own. */
async function load({ db }: Ctx, { before, after, on }: Compared): Promise<Loaded> {
  const [known, memberships] = await Promise.all([listRegions(db), listMemberships(db)]);
  const { code, name, kind } = after;
  const regions = known.some((region) => region.code === code) ? known : [...known, { code, name, kind, edition: null }];
  const versions = before === null ? [after] : [before, after];
  const days = [...new Set([on, ...versions.flatMap(({ trials }) => trials.map((trial) => trial.on))])];
  const around = versions.flatMap(({ memberships: own, ...place }) =>
    days.flatMap((day) => codesAround({ ...place, regions, on: day, memberships: new Map([...memberships, [place.code, own]]) })),
  );
  const base = regions.filter(({ kind }) => kind === 'base').map(({ code }) => code);
  const heads = await listEditionsInUse(db, [...new Set([...base, ...around, after.code])], endOf(on));
  const sheets = new Map<string, Sheet>();
  // One after the other: all at once would take every connection there is from other readers.
  for (const { region, number } of heads) {
    const edition = await readEdition(db, region, number);
    if (edition !== null) sheets.set(region, edition.sheet);
  }
  const names = new Map(regions.map((region) => [region.code, region.name]));
  const key = JSON.stringify([heads.map(({ hash }) => hash), [...memberships], [...names]]);
  return { proposal: { proposed: after, base: before, sheets, memberships, on, questions: QUESTIONS }, names, key };
}

type Around = Pick<Sheet, 'code' | 'kind'> & {
  readonly regions: readonly RegionHead[];
  readonly on: CalendarDate;
  readonly memberships: Memberships;
};

/** The base layer lies below every line without being named in one. */
function codesAround({ code, kind, regions, memberships, on }: Around): readonly string[] {
  return regions.flatMap((region) => {
    const { layers } = regionLine(memberships, region.code, on);
    return kind === 'base' || layers.includes(code) ? [...layers] : [];
  });
}

/** Of one id the later version's name counts, then the more local one's. */
function namesIn(proposal: Proposal, regions: ReadonlyMap<string, string>): ComparedNames {
  const { proposed, on } = proposal;
  const sheets = [...worldBefore(proposal).sheets.values(), ...worldAfter(proposal).sheets.values(), proposed];
  const terms = sheets.flatMap(({ code, terms: list }) =>
    list
      .toSorted((a, b) => Number(isInForce(a, on)) - Number(isInForce(b, on)))
      .map(({ id, name, category }) => [id, { name, region: code, category }] as const),
  );
  return {
    terms: new Map(terms),
    regions,
    rules: new Map(sheets.flatMap(({ rules }) => rules.map(({ id, title }) => [id, title] as const))),
  };
}
