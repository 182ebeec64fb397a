import type { ReactElement, ReactNode } from 'react';
import { RuleLine } from '@/components/regions/rule-card';
import { Disclosure } from '@/components/ui/disclosure';
import type { JudgedRule, RegionChecklist } from '@/lib/checks/domain/checklist';
import { byTopic, sectionsOf, type SectionName } from '@/lib/checks/domain/sections';
import { words } from '@/lib/kernel/words';
import { ChecklistItem, SpentLine } from './checklist-item';
import type { ListView } from './list-view';

type Props = { readonly region: RegionChecklist; readonly view: ListView };

const OPEN = ['sources-disagree', 'applies', 'treat-as-applying', 'not-settled'] as const;

/** The lines for one place, in the order they are read: what applies, what to treat as applying, what is open, the rest folded. */
export function ChecklistSections({ region, view }: Props): ReactElement {
  const sections = sectionsOf(region.rules);
  const { notes } = sections;
  const folded = notes.filter((rule) => !isCaution(rule) && !isUnreadLaw(rule));
  const show = (rules: readonly JudgedRule[]) => <ByTopic rules={rules} view={view} />;
  return (
    <>
      {OPEN.filter((name) => name === 'applies' || sections[name].length > 0).map((name) => (
        <Section key={name} name={name} view={view}>
          {name === 'applies' ? null : <p>{words(`checks.result.sectionTexts.${name}`)}</p>}
          {sections[name].length === 0 ? <p>{words('checks.result.empty')}</p> : show(sections[name])}
        </Section>
      ))}
      <Section name="notes" view={view}>
        <Unfolded lead="cautions" rules={notes.filter(isCaution)} view={view} />
        <Unfolded lead="fromMemory" rules={notes.filter(isUnreadLaw)} view={view} />
        <Folded count={folded.length} summary="notesThat" rules={folded} view={view} />
        <Folded count={sections['open-notes'].length} summary="notesOpen" rules={sections['open-notes']} view={view} />
      </Section>
      {sections.said.length === 0 ? null : (
        <Section name="said" view={view}>
          <p>{words('checks.result.sectionTexts.said')}</p>
          {show(sections.said)}
        </Section>
      )}
      <Section name="does-not-apply" view={view}>
        <Folded count={sections['does-not-apply'].length} summary="doesNot" rules={sections['does-not-apply']} view={view} />
      </Section>
    </>
  );
}

/** Advice on what a surface or a firing like this one's can do: a maker must meet it without unfolding anything. */
const isCaution = ({ region, topic }: JudgedRule): boolean => region === 'care' && (topic === 'surface' || topic === 'firing');

/** What may be a duty, though nobody read it: no must by itself, and not to be missed either. */
const isUnreadLaw = ({ standing, evidence }: JudgedRule): boolean => standing === 'law' && evidence === 'memory';

type UnfoldedProps = Pick<FoldedProps, 'rules' | 'view'> & { readonly lead: 'cautions' | 'fromMemory' };

/** Notes that nobody should have to unfold. */
function Unfolded({ lead, rules, view }: UnfoldedProps): ReactElement | null {
  if (rules.length === 0) return null;
  return (
    <>
      <p className="mt-4">{words(`checks.result.${lead}`)}</p>
      <ul className="mb-4">
        {rules.map((judged) => (
          <Short key={judged.id} part="notesThat" judged={judged} view={view} />
        ))}
      </ul>
    </>
  );
}

function ByTopic({ rules, view }: { readonly rules: readonly JudgedRule[]; readonly view: ListView }): ReactElement {
  return (
    <>
      {byTopic(rules).map((group) => (
        <div key={group.topic} className="mt-6">
          <h3 className="font-sans text-plain font-strong text-umber">{words(`regions.topic.${group.topic}`)}</h3>
          {group.rules.map((judged) => (
            <ChecklistItem key={judged.id} judged={judged} view={view} />
          ))}
        </div>
      ))}
    </>
  );
}

type SectionProps = { readonly name: Exclude<SectionName, 'open-notes'>; readonly view: ListView; readonly children: ReactNode };

function Section({ name, view, children }: SectionProps): ReactElement {
  const id = `${view.code}-${name}`;
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{words(`checks.result.sections.${name}`)}</h2>
      {children}
    </section>
  );
}

type FoldedProps = {
  readonly count: number;
  readonly summary: 'notesThat' | 'notesOpen' | 'doesNot';
  readonly rules: readonly JudgedRule[];
  readonly view: ListView;
};

/** Counted and folded; printed open. Lines that do not apply say why not, notes what they say. */
function Folded({ count, summary, rules, view }: FoldedProps): ReactElement | null {
  if (count === 0) return null;
  return (
    <Disclosure summary={words(`checks.result.folded.${summary}`, { count })}>
      <ul>
        {rules.map((judged) => (
          <Short key={judged.id} part={summary} judged={judged} view={view} />
        ))}
      </ul>
    </Disclosure>
  );
}

type ShortProps = { readonly part: FoldedProps['summary']; readonly judged: JudgedRule; readonly view: ListView };

/** A folded line: why it does not apply, what a note says, or of a note that only may matter its name. */
function Short({ part, judged, view }: ShortProps): ReactElement | null {
  if (part === 'doesNot') return <SpentLine judged={judged} view={view} />;
  if (part === 'notesOpen') {
    return (
      <li className="py-1">
        <a href={`/rules/${judged.id}`}>{judged.title}</a>
      </li>
    );
  }
  const rule = view.told.get(judged.id);
  return rule === undefined ? null : <RuleLine rule={rule} numberOf={view.numberOf} />;
}
