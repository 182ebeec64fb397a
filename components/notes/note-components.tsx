import type { ReactElement, ReactNode } from 'react';
import { Panel } from '@/components/ui/panel';
import { words } from '@/lib/kernel/words';
import type { NoteFact, NumberedSource } from '@/lib/notes/domain/note-sources';
import type { ConeChart } from '@/lib/pieces/domain/cone';
import type { NamedRule } from '@/lib/regions/domain/heard-claim';
import { CheckStep } from './check-step';
import { CiteMark, type CiteState } from './cite-mark';
import { NoteDrawing } from './note-drawing';

type Block = { readonly children?: ReactNode };

/** The building blocks of a note's text, by the names it uses. */
export type NoteComponents = {
  readonly Fact: (props: { readonly id: string }) => ReactElement;
  readonly Rule: (props: { readonly id: string; readonly short?: boolean }) => ReactElement;
  readonly Term: (props: Block & { readonly id: string }) => ReactElement;
  readonly Check: (props: { readonly question: string; readonly answer: string }) => ReactElement;
  readonly Caution: (props: Block) => ReactElement;
  readonly Drawing: (props: Block & { readonly of: string }) => ReactElement;
  readonly Figures: (props: Block & { readonly caption: string }) => ReactElement;
};

export type NoteMaterial = {
  readonly sources: readonly NumberedSource[];
  /** The cited rules that are in use, by id. */
  readonly rules: ReadonlyMap<string, NamedRule>;
  readonly charts: readonly ConeChart[];
};

/** The blocks of one note. Citations carry the numbers of its own list of sources. */
export function noteComponents({ sources, rules, charts }: NoteMaterial): NoteComponents {
  const numbered = (kind: NumberedSource['kind'], id: string): NumberedSource => {
    const found = sources.find((source) => source.kind === kind && source.ids.includes(id));
    if (found === undefined) throw new Error(`The note cites "${id}", which is on its list of sources under no number`);
    return found;
  };
  return {
    Fact: ({ id }) => {
      const source = numbered('text', id);
      return <CiteMark number={source.number} state={source.kind === 'text' ? stateOfFact(source.fact) : 'read'} />;
    },
    Rule: ({ id, short = false }) => {
      const rule = rules.get(id) ?? null;
      const mark = <CiteMark number={numbered('rule', id).number} state={stateOfRule(rule)} />;
      if (short || rule === null) return mark;
      return (
        <>
          <a href={`/rules/${id}`}>{rule.title}</a> {words('notes.cite.place', { place: rule.place })} {mark}
        </>
      );
    },
    Term: ({ id, children }) => (
      <a className="term-link" href={`/words/${id}`}>
        {children}
      </a>
    ),
    Check: CheckStep,
    Caution: ({ children }) => (
      <div className="note-caution">
        <Panel colour="ash">{children}</Panel>
      </div>
    ),
    Drawing: ({ of, children }) => (
      <NoteDrawing of={of} charts={charts}>
        {children}
      </NoteDrawing>
    ),
    Figures: ({ caption, children }) => (
      <div className="scroll-area" role="region" aria-label={caption} tabIndex={0}>
        {children}
      </div>
    ),
  };
}

function stateOfFact({ evidence, weak }: NoteFact): CiteState {
  return evidence === 'read' && weak ? 'weak' : evidence;
}

function stateOfRule(rule: NamedRule | null): CiteState {
  if (rule === null) return 'read';
  return rule.standing === 'common-practice' ? 'common-practice' : rule.evidence;
}
