/* Looks every region sheet through and prints a Markdown table. `npm run content`, `npm run content -- eu dk --all` for every remark. */
import { readFileSync, readdirSync } from 'node:fs';
import { parseSheetFile } from '../content/seed/sheet-file';
import lists from '../content/words/allowed.json';
import { calendarDateOf } from '../lib/kernel/calendar-date';
import { reportSheet, type ContentReport } from '../lib/regions/domain/content-report';

const folder = new URL('../content/seed/regions/', import.meta.url);
const today = calendarDateOf(new Date());

const asked = process.argv.slice(2).filter((word) => !word.startsWith('--'));
const wantsAll = process.argv.includes('--all');
const names = asked.length > 0 ? asked.map((code) => `${code}.json`) : readdirSync(folder).filter((name) => name.endsWith('.json'));

const schemaFaults: string[] = [];
const reports: ContentReport[] = [];
for (const name of names.toSorted()) {
  const parsed = parseSheetFile(`regions/${name}`, readFileSync(new URL(name, folder), 'utf8'));
  if (parsed.ok) reports.push(reportSheet(parsed.value, lists, today));
  else schemaFaults.push(...parsed.error);
}

const count = ({ remarks }: ContentReport, kind: ContentReport['remarks'][number]['kind']): number =>
  remarks.filter((remark) => remark.kind === kind).length;
const faultsOf = ({ faults }: ContentReport, kind: ContentReport['faults'][number]['kind']): number =>
  faults.filter((fault) => fault.kind === kind).length;

type Column = { readonly heading: string; readonly figure: (report: ContentReport) => number };

const COLUMNS: readonly Column[] = [
  { heading: 'rules', figure: ({ rules }) => rules },
  { heading: 'read', figure: ({ read }) => read },
  { heading: 'from memory', figure: ({ memory }) => memory },
  { heading: 'common practice', figure: ({ commonPractice }) => commonPractice },
  { heading: 'limits', figure: ({ limits }) => limits },
  { heading: 'trial pieces', figure: ({ trials }) => trials },
  { heading: 'due for a look', figure: (report) => count(report, 'look-again') },
  { heading: 'dead links', figure: (report) => count(report, 'dead-link') },
  { heading: 'long sentences', figure: (report) => count(report, 'long-sentence') },
  { heading: 'banned words', figure: (report) => faultsOf(report, 'banned-word') },
  { heading: 'unsourced musts', figure: (report) => faultsOf(report, 'unsourced-must') },
];

const row = (cells: readonly (string | number)[]): string => `| ${cells.join(' | ')} |`;
console.log(row(['region', ...COLUMNS.map(({ heading }) => heading)]));
console.log(row(['---', ...COLUMNS.map(() => '---:')]));
for (const report of reports) console.log(row([report.code, ...COLUMNS.map(({ figure }) => figure(report))]));
console.log(
  row([`all ${String(reports.length)}`, ...COLUMNS.map(({ figure }) => reports.reduce((sum, report) => sum + figure(report), 0))]),
);

const faults = reports.flatMap(({ code, faults: found }) => found.map(({ kind, at, said }) => `${code}: ${at}: ${kind}: ${said}`));
const remarks = reports.flatMap(({ code, remarks: found }) => found.map(({ kind, at, said }) => `${code}: ${at}: ${kind}: ${said}`));
if (wantsAll && remarks.length > 0) console.log(`\n${remarks.join('\n')}`);
if (schemaFaults.length + faults.length > 0) console.log(`\n${[...schemaFaults, ...faults].join('\n')}`);
process.exitCode = schemaFaults.length + faults.length === 0 ? 0 : 1;
