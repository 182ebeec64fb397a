/* Says what is wrong with seed sheets: file, rule, field, words. `npx tsx scripts/check-seed.ts eu dk` */
import { readFileSync, readdirSync } from 'node:fs';
import type { Sheet } from '../lib/regions/domain/sheet';
import { sheetDocument } from '../lib/regions/schema';

type Pack = {
  readonly regions?: readonly { readonly code: string; readonly facts: readonly { readonly id: string }[] }[];
  readonly facts?: readonly { readonly id: string }[];
};

/** Prints the researched facts that a sheet neither carries nor lists as left out, and those it names that do not exist. */
function reportFacts(sheet: Sheet): void {
  const packs = new URL('../tests/fixtures/facts/', import.meta.url);
  const researched = readdirSync(packs)
    .filter((name) => name.endsWith('.json'))
    .map((name) => JSON.parse(readFileSync(new URL(name, packs), 'utf8')) as Pack)
    .flatMap((pack) =>
      sheet.code === 'care'
        ? (pack.facts ?? [])
        : (pack.regions ?? [])
            .filter((region) => region.code.toLowerCase().replace(/^iso-iec-/, 'iso-') === sheet.code)
            .flatMap((region) => region.facts),
    )
    .map((fact) => fact.id);
  const carried = [...sheet.rules, ...sheet.terms].flatMap((item) => item.facts).concat(sheet.textFacts);
  const leftOut = sheet.leftOut.map((item) => item.fact);
  const named = new Set([...carried, ...leftOut]);
  const missing = researched.filter((id) => !named.has(id));
  const strange = [...named].filter((id) => !researched.includes(id));
  const both = leftOut.filter((id) => carried.includes(id));
  console.log(`${sheet.code}: ${String(researched.length)} facts researched, ${String(missing.length)} missing: ${missing.join(' ')}`);
  if (strange.length > 0) console.log(`${sheet.code}: not in its pack: ${strange.join(' ')}`);
  if (both.length > 0) console.log(`${sheet.code}: carried and left out: ${both.join(' ')}`);
}

const folder = new URL('../content/seed/regions/', import.meta.url);
const wanted = process.argv.slice(2);
const names = wanted.length > 0 ? wanted.map((code) => `${code}.json`) : readdirSync(folder);
let faults = 0;
for (const name of names) {
  const raw: unknown = JSON.parse(readFileSync(new URL(name, folder), 'utf8'));
  const parsed = sheetDocument.safeParse(raw);
  if (parsed.success) {
    reportFacts(parsed.data);
    console.log(`${name}: ${parsed.data.rules.length} rules, ${parsed.data.terms.length} terms, ${parsed.data.leftOut.length} left out`);
    continue;
  }
  for (const issue of parsed.error.issues.slice(0, 40)) {
    faults += 1;
    const [list, index] = issue.path;
    const item = list === 'rules' || list === 'terms' ? (raw as Record<string, { id?: string }[]>)[list]?.[Number(index)]?.id : undefined;
    console.log(
      `${name}: ${item ?? ''} ${issue.path.join('/')}: ${issue.message} ${'errors' in issue ? JSON.stringify(issue.errors).slice(0, 600) : ''}`,
    );
  }
}
process.exit(faults === 0 ? 0 : 1);
