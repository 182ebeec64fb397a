import type { ReactElement, ReactNode } from 'react';
import { StrengthLine } from '@/components/regions/strength-line';
import { words } from '@/lib/kernel/words';
import type { NoteFact, NumberedSource } from '@/lib/notes/domain/note-sources';
import type { NamedRule } from '@/lib/regions/domain/heard-claim';

type Props = {
  readonly label: string;
  readonly sources: readonly NumberedSource[];
  /** The cited rules that are in use, by id. */
  readonly rules: ReadonlyMap<string, NamedRule>;
};

/** The sources of a note. Each line is what its number in the text leads to. */
export function NoteSources({ label, sources, rules }: Props): ReactElement {
  return (
    <ol className="sources" aria-label={label}>
      {sources.map((source) => (
        <li key={source.number} id={`source-${source.number}`} className="keep-together">
          {source.kind === 'text' ? <TextSource fact={source.fact} /> : <RuleSource rule={rules.get(source.ids[0] ?? '') ?? null} />}
        </li>
      ))}
    </ol>
  );
}

function TextSource({ fact: { source, evidence, weak } }: { readonly fact: NoteFact }): ReactElement {
  const { title, publisher, identifier, locator, url, versionDate } = source;
  return (
    <>
      <Linked url={url}>
        <cite>{title}</cite>
      </Linked>
      {[identifier, locator].flatMap((part) => (part === undefined ? [] : [`, ${part}`])).join('')}. <bdi>{publisher}</bdi>.
      <p className="text-umber">
        {[sayEvidence(evidence, weak), versionDate === undefined ? null : words('notes.cite.version', { version: versionDate })]
          .filter((part) => part !== null)
          .join(' · ')}
      </p>
    </>
  );
}

function sayEvidence(evidence: NoteFact['evidence'], weak: boolean): string {
  if (evidence === 'common-practice') return words('notes.cite.said');
  if (evidence === 'memory') return words('notes.cite.fromMemory');
  return weak ? words('notes.cite.weakCopy') : words('notes.cite.read');
}

function Linked({ url, children }: { readonly url: string | undefined; readonly children: ReactNode }): ReactElement {
  if (url === undefined) return <>{children}</>;
  return (
    <>
      <a href={url}>{children}</a>
      <span className="only-print"> ({url})</span>
    </>
  );
}

function RuleSource({ rule }: { readonly rule: NamedRule | null }): ReactElement {
  if (rule === null) return <>{words('notes.cite.ruleGone')}</>;
  return (
    <>
      <a href={`/rules/${rule.id}`}>{rule.title}</a>. {words('notes.cite.rule', { place: rule.place })}.
      {rule.source === null ? null : (
        <p>
          <cite>{rule.source}</cite>
        </p>
      )}
      <StrengthLine strength={rule.strength} standing={rule.standing} evidence={rule.evidence} />
    </>
  );
}
