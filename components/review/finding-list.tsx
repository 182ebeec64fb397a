import type { ReactElement } from 'react';
import type { Finding } from '@/lib/checks/domain/finding';
import { sayFinding } from '@/lib/checks/domain/finding-words';
import { words, wordsAt } from '@/lib/kernel/words';
import type { ComparedNames } from '@/lib/regions/domain/compared-editions';

/** Titles of trial pieces stand beside those of rules and terms. */
type Names = ComparedNames & { readonly trials: ReadonlyMap<string, string> };
type Props = { readonly findings: readonly Finding[]; readonly names: Names };

/** What the ten checks say of the proposal, what keeps it from coming into use first. */
export function FindingList({ findings, names }: Props): ReactElement {
  if (findings.length === 0) return <p className="mt-2">{words('review.findings.none')}</p>;
  const errors = findings.filter(({ level }) => level === 'error');
  const notes = findings.filter(({ level }) => level === 'note');
  return (
    <>
      {errors.length === 0 ? null : (
        <Part title={words('review.findings.errors', { count: errors.length })} findings={errors} names={names} />
      )}
      {notes.length === 0 ? null : <Part title={words('review.findings.notes', { count: notes.length })} findings={notes} names={names} />}
    </>
  );
}

function Part({ title, findings, names }: Props & { readonly title: string }): ReactElement {
  return (
    <>
      <h3 className="mt-4">{title}</h3>
      <ul className="mt-2 flex list-disc flex-col gap-2 ps-6 font-sans text-plain">
        {findings.map((finding, place) => {
          const { where, text } = sayFinding(named(finding, names));
          return (
            <li key={place} className="wrap-anywhere">
              <span className="font-strong">{where}.</span> {text}
            </li>
          );
        })}
      </ul>
    </>
  );
}

/** The finding with names where it has ids: a moderator reads titles, and fields by the words of the differences. */
function named(finding: Finding, names: Names): Finding {
  const { at, values } = finding;
  const said = Object.entries(values).map(
    ([name, value]) => [name, typeof value === 'string' ? nameOf(name, value, names) : value] as const,
  );
  return { ...finding, at: { ...at, id: nameOf('', at.id, names), field: fieldWords(at.field) }, values: Object.fromEntries(said) };
}

const nameOf = (name: string, id: string, { rules, terms, regions, trials }: Names): string =>
  rules.get(id) ?? terms.get(id)?.name ?? trials.get(id) ?? (name === 'region' ? regions.get(id) : undefined) ?? id;

/** Parts of the document whose fields are told under another name. */
const FIELDS: Readonly<Record<string, string>> = { sources: 'source', payload: 'detail', from: 'dates', to: 'dates' };

/** A place in the document, `sources/0/passage`, by the name of the field a reader knows. What is about all of it names none. */
function fieldWords(path: string): string {
  const [field = ''] = path.split('/');
  return field === 'id' ? '' : (wordsAt(`editions.field.${FIELDS[field] ?? field}`) ?? field);
}
