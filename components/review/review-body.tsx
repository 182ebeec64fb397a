import type { ReactElement, ReactNode } from 'react';
import { PlacesBelow, SheetDifferences, UneditedRules } from '@/components/regions/editions-comparison';
import { TrialChanges } from '@/components/regions/trial-changes';
import { words } from '@/lib/kernel/words';
import type { ClaimToRead, Review } from '@/lib/regions/domain/amendment-view';
import { changedUnedited } from '@/lib/regions/domain/compared-editions';
import type { ItemDifference } from '@/lib/regions/domain/sheet-difference';
import { linesOf, remarksByLine, type LineNames } from './anchors';
import { BecomesTrue, Effects } from './becomes-true';
import { ClaimList } from './claim-list';
import { DecidePanel } from './decide-panel';
import { DecisionList } from './decision-list';
import { FindingList } from './finding-list';
import { IntendedWords } from './intended-words';
import { AllRemarks, LineRemarks, type RemarkActs } from './line-remarks';
import { ThreeWay } from './three-way';

type Props = {
  readonly review: Review;
  readonly names: LineNames;
  /** Null for whoever may only read. */
  readonly acts: RemarkActs | null;
  readonly tick: ((claim: ClaimToRead) => ReactNode) | null;
  /** The form that gives a stale amendment back. */
  readonly giveBack: ReactNode;
  /** The form that releases a held one. */
  readonly release: ReactNode;
};

/** The whole of an amendment as a moderator reads it: what becomes true, each difference, each source, and the ways to decide. */
export function ReviewBody({ review, names, acts, tick, giveBack, release }: Props): ReactElement {
  const { comparison, claims, findings, remarks, decisions, stale } = review;
  const { items, below, trials, names: told } = comparison;
  const meanings = comparison.meanings;
  const lines = remarksByLine(remarks);
  const remarksOn = (line: string): ReactElement => (
    <LineRemarks key={line} line={line} name={names.get(line) ?? line} remarks={lines.get(line) ?? []} acts={acts} />
  );
  const belowItem = (item: ItemDifference): ReactNode => linesOf(item).map(remarksOn);
  return (
    <>
      <Contents parts={partsOf(review, tick !== null)} />
      {stale === null ? null : (
        <Part id="stale">
          <ThreeWay stale={stale} />
          {giveBack}
        </Part>
      )}
      <Part id="becomes">
        <div className="mt-3 max-w-text">
          <BecomesTrue compared={comparison} />
          <Effects compared={comparison} needsSecond={review.needed === 2 && review.given === 0} />
        </div>
      </Part>
      <Part id="differences">
        <SheetDifferences items={items} meanings={meanings.ok ? meanings.value : []} names={told} sides="amendment" below={belowItem} />
        <UneditedRules meanings={changedUnedited(meanings, items)} names={told} sides="amendment" />
        <PlacesBelow below={below} names={told} sides="amendment" />
        <TrialChanges trials={trials} names={told} sides="amendment" />
        <IntendedWords changed={trials.changed} intended={review.amendment.intended} />
      </Part>
      <Part id="claims">
        <ClaimList claims={claims} tick={tick} below={({ key }) => remarksOn(key)} />
      </Part>
      <Part id="findings">
        <FindingList findings={findings} names={{ ...told, trials: new Map(trials.changed.map(({ id, title }) => [id, title])) }} />
      </Part>
      <Part id="remarks">
        <AllRemarks remarks={remarks} names={names} acts={acts} />
      </Part>
      <Part id="decisions">
        <DecisionList decisions={decisions} />
      </Part>
      {tick === null ? null : (
        <Part id="decide">
          <DecidePanel review={review} release={release} />
        </Part>
      )}
    </>
  );
}

const PARTS = ['stale', 'becomes', 'differences', 'claims', 'findings', 'remarks', 'decisions', 'decide'] as const;
type PartId = (typeof PARTS)[number];

const partsOf = ({ stale }: Review, mayDecide: boolean): readonly PartId[] =>
  PARTS.filter((part) => (part === 'stale' ? stale !== null : part === 'decide' ? mayDecide : true));

/** Ids of the parts do not meet those of changed items: `rules-…`, `sources-…`. */
const partAnchor = (id: PartId): string => `part-${id}`;

function Contents({ parts }: { readonly parts: readonly PartId[] }): ReactElement {
  return (
    <nav aria-label={words('review.page.contents')} className="not-in-print mt-6">
      <ul className="site-menu" role="list">
        {parts.map((part) => (
          <li key={part}>
            <a href={`#${partAnchor(part)}`}>{words(`review.page.part.${part}`)}</a>
          </li>
        ))}
      </ul>
    </nav>
  );
}

function Part({ id, children }: { readonly id: PartId; readonly children: ReactNode }): ReactElement {
  return (
    <section className="review-part" aria-labelledby={partAnchor(id)}>
      <h2 id={partAnchor(id)}>{words(`review.page.part.${id}`)}</h2>
      {children}
    </section>
  );
}
