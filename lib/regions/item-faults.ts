import type { z } from 'zod';
import { words } from '@/lib/kernel/words';

type Issue = z.core.$ZodIssue;

/** Parts whose fault is shown at another field than their own. */
const SHOWN_AT: Readonly<Record<string, string>> = { standing: 'sources.0.standing', when: 'when.join' };

/** Faults of an item's schema in the words of its form, by field; the first of each field. */
export function itemFaults(issues: readonly Issue[]): Readonly<Record<string, string>> {
  const faults = new Map<string, string>();
  for (const issue of issues) {
    const name = nameOf(issue);
    if (!faults.has(name)) faults.set(name, wordsOf(issue, name));
  }
  return Object.fromEntries(faults);
}

function nameOf({ path }: Issue): string {
  if (path.length === 0) return 'form';
  const name = path.map(String).join('.');
  const citation = /^sources\.\d+$/.test(name) ? `${name}.passageLang` : name;
  return SHOWN_AT[citation] ?? citation;
}

function wordsOf(issue: Issue, name: string): string {
  if (issue.code === 'too_big') return words('amend.fault.long', { most: Number(issue.maximum) });
  if (issue.code === 'too_small') return words(name === 'sources' ? 'amend.fault.noSource' : 'amend.fault.needed');
  if (issue.code === 'invalid_format') return formatWords(name, issue.format);
  return issue.code === 'custom' ? (customWords(name) ?? issue.message) : words('amend.fault.needed');
}

function formatWords(name: string, format: string): string {
  if (format === 'url') return words('amend.fault.link');
  if (name.endsWith('.source')) return words('amend.fault.source');
  if (name.endsWith('.rule') || /^(targets|alongside)[.]/.test(name)) return words('amend.fault.rule');
  return words(name.endsWith('.passageLang') ? 'amend.fault.lang' : 'amend.fault.shape');
}

/** Where the schema speaks to somebody who writes a file, a form says it its own way. */
function customWords(name: string): string | null {
  switch (name) {
    case 'strength':
      return words('amend.fault.strength');
    case 'targets':
      return words('amend.fault.targets');
    case 'payload.amount.unit':
      return words('amend.fault.limitUnit');
    default:
      return name.endsWith('.passageLang') ? words('amend.fault.passageLang') : dateWords(name);
  }
}

const DATES = new Set(['from', 'lookAgainBy', 'seenOn', 'on', 'payload.asOf']);
const dateWords = (name: string): string | null => (DATES.has(name) ? words('amend.fault.date') : null);
