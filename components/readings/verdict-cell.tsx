import type { ReactElement } from 'react';
import { questionWords } from '@/components/checks/question-words';
import { SourceTitle } from '@/components/regions/source-details';
import { MemoryMark, StrengthLine } from '@/components/regions/strength-line';
import { Disclosure } from '@/components/ui/disclosure';
import { sayList } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { Verdict } from '@/lib/readings/domain/verdict';
import { sayDecision, sayUnit } from '@/lib/regions/domain/figure-words';
import { sayCompared } from './figure-words';
import { StatusMark } from './status-mark';

type Props = {
  readonly verdict: Verdict;
  /** The compared figure rests on a reading below detection. */
  readonly below: boolean;
};

/** One verdict: how it stands, why, the limit, what was compared with it, how the place decides, and the source. */
export function VerdictCell({ verdict, below }: Props): ReactElement {
  const { status, reason, compared, ifConfirmed, why } = verdict;
  return (
    <>
      <StatusMark status={status} />
      {reason === null ? null : <span className="block font-strong">{words(`readings-page.reason.${reason}`)}</span>}
      {ifConfirmed === undefined ? null : (
        <span className="block">{words('readings-page.result.ifConfirmed', { status: words(`readings-page.status.${ifConfirmed}`) })}</span>
      )}
      <span className="block">{why}</span>
      <LimitLine verdict={verdict} />
      <span className="block">
        {compared === null
          ? words('readings-page.result.notCompared')
          : words('readings-page.result.compared', { figure: sayCompared(compared, below) })}
      </span>
      {verdict.strength === null || verdict.standing === null ? null : (
        <StrengthLine strength={verdict.strength} standing={verdict.standing} />
      )}
      <Disclosure summary={words('readings-page.result.more')}>
        <Deciding verdict={verdict} />
        <StillOpen verdict={verdict} />
        <Sources verdict={verdict} />
      </Disclosure>
    </>
  );
}

type Part = Pick<Props, 'verdict'>;

function LimitLine({ verdict: { limit, per, evidence } }: Part): ReactElement {
  if (limit === null || per === null) return <span className="block">{words('readings-page.result.noLimit')}</span>;
  return (
    <span className="block">
      {words('readings-page.result.limit', { limit: sayUnit(limit.value, limit.unit) })} {words(`readings-page.result.per.${per}`)}{' '}
      {evidence === 'memory' ? <MemoryMark /> : null}
    </span>
  );
}

function Deciding({ verdict: { decision, decisionEvidence } }: Part): ReactElement | null {
  if (decision === null) return null;
  return (
    <>
      <span className="block">{sayDecision(decision).join(' ')}</span>
      {decisionEvidence === 'memory' ? <span className="block">{words('readings-page.result.doubt')}</span> : null}
    </>
  );
}

/** Other limits that may count instead, and the answers that would decide it. */
function StillOpen({ verdict: { alsoPossible, assuming } }: Part): ReactElement | null {
  if (alsoPossible.length === 0 && assuming.length === 0) return null;
  return (
    <span className="block">
      {alsoPossible.length === 0 ? null : (
        <>
          {words('readings-page.result.alsoPossible')}{' '}
          {alsoPossible.map((rule, place) => (
            <span key={rule}>
              {place === 0 ? null : ', '}
              <a href={`/rules/${rule}`}>{rule}</a>
            </span>
          ))}
          .{' '}
        </>
      )}
      {assuming.length === 0
        ? null
        : words('readings-page.result.assuming', { questions: sayList(assuming.map((id) => questionWords(id, 'short'))) })}
    </span>
  );
}

function Sources({ verdict: { rule, sources } }: Part): ReactElement | null {
  const [source] = sources;
  if (rule === null) return null;
  return (
    <span className="block wrap-anywhere">
      <a href={`/rules/${rule}`}>{words('readings-page.result.rule')}</a>
      {source === undefined ? null : (
        <>
          {'. '}
          {words('readings-page.result.source')} <SourceTitle title={source.title} url={source.url} />
          {source.locator === undefined ? null : <>, {source.locator}</>}
        </>
      )}
    </span>
  );
}
