import 'server-only';
import { listEditionsInUse } from '@/db/editions';
import { listMemberships, listRegions } from '@/db/regions';
import type { Edition } from '@/db/rows/edition-row';
import type { RegionHead } from '@/db/rows/region-row';
import { bothLines, type BothLines } from '@/lib/checks/domain/compiled-days';
import { compareMeaning } from '@/lib/checks/domain/meaning';
import { isChanged, regionsBelow, worldAfter, worldBefore, type Proposal } from '@/lib/checks/domain/proposal-lines';
import { QUESTIONS } from '@/lib/checks/domain/questions';
import { compareTrials } from '@/lib/checks/domain/trial-comparison';
import { calendarDateOf, type CalendarDate } from '@/lib/kernel/calendar-date';
import { err, ok, type Result } from '@/lib/kernel/result';
import type { Ctx } from '@/lib/server/ctx';
import { endOf } from '@/lib/server/load-lines';
import { readEdition } from '@/lib/server/sheets';
import type { ComparedEdition, ComparedEditions, ComparedNames, LineMeanings } from './domain/compared-editions';
import { regionLine, type Memberships } from './domain/line';
import { isInForce } from './domain/rule';
import type { Sheet } from './domain/sheet';
import { sheetDifference } from './domain/sheet-difference';

export type EditionChoice = {
  readonly code: string;
  readonly from: number;
  readonly to: number;
  /** The day for which meanings are compared; today when none is given. */
  readonly on?: CalendarDate | undefined;
};

/**
 * Compares two editions of a sheet. Meanings are those on one day, with the other layers in the edition in use at its end and
 * with the memberships that each edition itself gives the place. Refuses an edition that does not exist, or the same twice.
 */
export async function compareEditions(
  ctx: Ctx,
  { code, from, to, on = calendarDateOf(ctx.now) }: EditionChoice,
): Promise<Result<ComparedEditions, { kind: 'not-found' } | { kind: 'same-edition' }>> {
  const [before, after] = [await readEdition(ctx.db, code, from), await readEdition(ctx.db, code, to)];
  if (before === null || after === null) return err({ kind: 'not-found' });
  if (from === to) return err({ kind: 'same-edition' });
  const loaded = await load(ctx, { before: before.sheet, after: after.sheet, on });
  const key = JSON.stringify([before.hash, after.hash, on, loaded.key]);
  const found = kept.get(key) ?? compare(loaded, before, after);
  keepFound(key, found);
  return ok(found);
}

/** Comparisons are kept by all that goes into them; a sheet with many places below takes a while. */
const kept = new Map<string, ComparedEditions>();
const COMPARISONS = 40;

function keepFound(key: string, found: ComparedEditions): void {
  kept.set(key, found);
  const [oldest] = kept.keys();
  if (kept.size > COMPARISONS && oldest !== undefined) kept.delete(oldest);
}

const headOf = ({ number, summary, inUseFrom }: Edition): ComparedEdition => ({ number, summary, inUseFrom });

function compare({ proposal, names }: Loaded, before: Edition, after: Edition): ComparedEditions {
  const lines = bothLines(proposal);
  return {
    code: after.region,
    name: after.sheet.name,
    from: headOf(before),
    to: headOf(after),
    on: proposal.on,
    items: sheetDifference(before.sheet, after.sheet),
    meanings: meaningsIn(proposal, lines, after.region),
    below: regionsBelow(proposal, [proposal.on]).map((below) => ({
      code: below,
      name: names.get(below) ?? below,
      meanings: meaningsIn(proposal, lines, below),
    })),
    trials: compareTrials({ before: before.sheet, after: after.sheet }, lines, QUESTIONS),
    names: namesIn(proposal, names),
  };
}

/** Where no rule, term or membership is otherwise, no meaning is. */
const meaningsIn = (proposal: Proposal, { before, after }: BothLines, code: string): LineMeanings =>
  isChanged(proposal) ? compareMeaning({ before: before.input(code, proposal.on), after: after.input(code, proposal.on) }) : ok([]);

type Compared = { readonly before: Sheet; readonly after: Sheet; readonly on: CalendarDate };
/** `key` is another for other sheets, other memberships or other names of places. */
type Loaded = { readonly proposal: Proposal; readonly names: ReadonlyMap<string, string>; readonly key: string };

/** Both editions among the sheets that they are read with: the layers above, and every place below with all of its own. */
async function load({ db }: Ctx, { before, after, on }: Compared): Promise<Loaded> {
  const [regions, memberships] = await Promise.all([listRegions(db), listMemberships(db)]);
  const days = [...new Set([on, ...[before, after].flatMap(({ trials }) => trials.map((trial) => trial.on))])];
  const around = [before, after].flatMap(({ code, kind, memberships: own }) =>
    days.flatMap((day) => codesAround({ code, kind, regions, on: day, memberships: new Map([...memberships, [code, own]]) })),
  );
  const base = regions.filter(({ kind }) => kind === 'base').map(({ code }) => code);
  const heads = await listEditionsInUse(db, [...new Set([...base, ...around, after.code])], endOf(on));
  const sheets = new Map<string, Sheet>();
  // One after the other: all at once would take every connection there is from other readers.
  for (const { region, number } of heads) {
    const edition = await readEdition(db, region, number);
    if (edition !== null) sheets.set(region, edition.sheet);
  }
  const names = new Map(regions.map(({ code, name }) => [code, name]));
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
