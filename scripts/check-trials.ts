/* Runs the trial pieces of seed sheets: `npx tsx --tsconfig .ci/tsconfig.node.json scripts/check-trials.ts no se` */
import { readdirSync, readFileSync } from 'node:fs';
import { parsePlacesFile, parseSheetFile } from '../content/seed/sheet-file';
import { compileLine, type CompiledLine } from '../lib/checks/domain/line';
import { QUESTIONS } from '../lib/checks/domain/questions';
import { runTrial, type TrialDifference } from '../lib/checks/domain/trial-run';
import type { CalendarDate } from '../lib/kernel/calendar-date';
import { regionLine } from '../lib/regions/domain/line';
import type { Sheet } from '../lib/regions/domain/sheet';

const FOLDER = new URL('../content/seed/', import.meta.url);
const text = (path: string): string => readFileSync(new URL(path, FOLDER), 'utf8');

/** Sheets that do not parse are passed over, so that one in the making keeps nobody from running the others. */
const sheets = new Map<string, Sheet>();
const broken = new Map<string, readonly string[]>();
for (const name of readdirSync(new URL('regions/', FOLDER)).filter((file) => file.endsWith('.json'))) {
  const sheet = parseSheetFile(name, text(`regions/${name}`));
  if (sheet.ok) sheets.set(sheet.value.code, sheet.value);
  else broken.set(name.replace(/\.json$/, ''), sheet.error);
}
const places = parsePlacesFile('places.json', text('places.json'));
if (!places.ok) throw new Error(places.error.join('\n'));
const memberships = new Map([...places.value, ...sheets.values()].map(({ code, memberships: edges }) => [code, edges] as const));

type Found = { readonly missing: readonly string[]; readonly line: CompiledLine | string };

/** The line of a place on a day, or why it does not compile, with the layers that have no sheet to read. */
function lineOf(code: string, on: CalendarDate): Found {
  const { layers, except } = regionLine(memberships, code, on);
  const known = [...memberships.keys()].flatMap((place) => {
    const { layers: own } = regionLine(memberships, place, on);
    return own.length > 1 ? [{ code: place, line: own }] : [];
  });
  const compiled = compileLine({
    questions: QUESTIONS,
    layers: ['care', ...layers]
      .flatMap((layer) => sheets.get(layer) ?? [])
      .map(({ code: region, rules, terms }) => ({ region, rules, terms })),
    except: except.map(({ rule }) => rule),
    on,
    places: known,
  });
  return { missing: layers.filter((layer) => !sheets.has(layer)), line: compiled.ok ? compiled.value : JSON.stringify(compiled.error) };
}

function tell(difference: TrialDifference): string {
  switch (difference.kind) {
    case 'otherwise':
      return `${difference.rule} expected ${difference.expected} found ${difference.found}`;
    case 'no-such-rule':
      return `${difference.rule} expected ${difference.expected} found no such rule in the line on that day`;
    case 'unknown-question':
      return `there is no question "${difference.question}"`;
    case 'wrong-answer':
      return `the answer to "${difference.question}" is not of its kind`;
    case 'answered-and-declined':
      return `"${difference.question}" is answered and declined`;
  }
}

/** Prints what one sheet's trial pieces give and returns the number of faults. */
function report(sheet: Sheet): number {
  const faults: string[] = [];
  const lines = new Map<string, Found>();
  const lineFor = (on: CalendarDate): Found => {
    const found = lines.get(on) ?? lineOf(sheet.code, on);
    lines.set(on, found);
    return found;
  };
  for (const trial of sheet.trials) {
    const { line } = lineFor(trial.on);
    if (typeof line === 'string') faults.push(`${trial.id}: the line does not compile on ${trial.on}: ${line}`);
    else faults.push(...runTrial(line, trial, QUESTIONS).map((difference) => `${trial.id}: ${tell(difference)}`));
  }
  const twice = sheet.trials.map(({ id }) => id).filter((id, place, ids) => ids.indexOf(id) !== place);
  faults.push(...twice.map((id) => `${id}: this id stands here twice`));
  // The day of most sheets: a sheet without trial pieces is compiled too.
  if (sheet.trials.length === 0 && sheet.kind !== 'base') {
    const { line } = lineOf(sheet.code, TODAY);
    if (typeof line === 'string') faults.push(`the line does not compile: ${line}`);
  }
  for (const fault of faults) console.log(`${sheet.code}/${fault}`);
  const missing = [...new Set([...lines.values()].flatMap((found) => found.missing))];
  if (missing.length > 0) console.log(`${sheet.code}: layers without a sheet that can be read: ${missing.join(', ')}`);
  console.log(`${sheet.code}: ${String(sheet.trials.length)} trial pieces, ${String(faults.length)} faults`);
  return faults.length;
}

const TODAY = new Date().toISOString().slice(0, 10) as CalendarDate;
const wanted = process.argv.slice(2);
let faults = 0;
for (const code of wanted.length > 0 ? wanted : [...sheets.keys(), ...broken.keys()].sort()) {
  const sheet = sheets.get(code);
  if (sheet !== undefined) faults += report(sheet);
  else {
    faults += 1;
    console.log(`${code}: ${(broken.get(code) ?? ['there is no such sheet']).slice(0, 10).join('\n  ')}`);
  }
}
process.exit(faults === 0 ? 0 : 1);
