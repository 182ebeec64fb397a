import type { Contact, Sheet } from '@/lib/regions/domain/sheet';
import { replaceSheetEntries } from './search-entries';
import type { Trx } from './transaction';

/** Rows of rules, terms, sources, authorities and accreditation bodies, drawn from an edition's document, and what search finds of it. */
export async function insertProjection(trx: Trx, edition_number: number, sheet: Sheet): Promise<void> {
  const of = { region: sheet.code, edition_number };
  const contact = ({ name, url, role, evidence }: Contact, position: number) => ({ ...of, position, name, url, role, evidence });
  const tables: readonly (readonly [string, readonly object[]])[] = [
    ['rules', sheet.rules.map((rule) => ({ ...of, ...ruleColumns(rule) }))],
    ['terms', sheet.terms.map((term) => ({ ...of, ...termColumns(term) }))],
    ['sources', sheet.sources.map((source) => ({ ...of, ...sourceColumns(source) }))],
    ['authorities', sheet.authorities.map(contact)],
    ['accreditation_bodies', sheet.accreditation.map(contact)],
  ];
  for (const [table, rows] of tables) {
    for (let start = 0; start < rows.length; start += 200) await trx(table).insert(rows.slice(start, start + 200));
  }
  await replaceSheetEntries(trx, edition_number, sheet);
}

const ruleColumns = (rule: Sheet['rules'][number]) => ({
  id: rule.id,
  topic: rule.payload.topic,
  kind: rule.kind,
  strength: rule.strength,
  standing: rule.standing,
  title: rule.title,
  valid_from: rule.from,
  valid_to: rule.to,
  look_again_by: rule.lookAgainBy,
});

const termColumns = (term: Sheet['terms'][number]) => ({
  id: term.id,
  name: term.name,
  category: term.category,
  valid_from: term.from,
  valid_to: term.to,
});

const sourceColumns = (source: Sheet['sources'][number]) => ({
  id: source.id,
  title: source.title,
  publisher: source.publisher,
  identifier: source.identifier ?? null,
  url: source.url ?? null,
  version_date: source.versionDate ?? null,
  seen_on: source.seenOn ?? null,
  seen_via: source.seenVia ?? null,
});
