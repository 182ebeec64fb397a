import type { ReactElement } from 'react';
import { StrengthLine } from '@/components/regions/strength-line';
import { sayDate } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';
import type { AnsweredClaim, NamedRule } from '@/lib/regions/domain/heard-claim';

/** One claim of the trade, with what the texts say of it and what to do. */
export function HeardClaimSection({ claim }: { readonly claim: AnsweredClaim }): ReactElement {
  return (
    <section id={claim.id} aria-labelledby={`${claim.id}-title`} className="mt-12 max-w-text break-inside-avoid">
      <h2 id={`${claim.id}-title`} className="text-lead">
        <span className="block text-small text-umber">{words('heard.heard')}</span>
        <q>{claim.heard}</q>
      </h2>
      <h3 className="mt-4 text-read">{words('heard.found')}</h3>
      <p className="mt-1">{claim.says}</p>
      <h3 className="mt-4 text-read">{words('heard.do')}</h3>
      <p className="mt-1">{claim.doNow}</p>
      <h3 className="mt-4 text-read">{words('heard.rests')}</h3>
      {claim.rules.length === 0 ? <p className="mt-1">{words('heard.noRules')}</p> : <RuleList rules={claim.rules} />}
      <LookedIn claim={claim} />
    </section>
  );
}

function RuleList({ rules }: { readonly rules: readonly NamedRule[] }): ReactElement {
  return (
    <ul className="mt-1 list-disc ps-6">
      {rules.map((rule) => (
        <li key={rule.id} className="mt-2">
          {words('heard.place', { place: rule.place })} <a href={`/rules/${rule.id}`}>{rule.title}</a>
          <StrengthLine strength={rule.strength} standing={rule.standing} evidence={rule.evidence} />
          {rule.source !== null && <span className="block text-plain text-umber">{rule.source}</span>}
        </li>
      ))}
    </ul>
  );
}

function LookedIn({ claim }: { readonly claim: AnsweredClaim }): ReactElement | null {
  if (claim.lookedIn.length === 0) return null;
  return (
    <>
      <h3 className="mt-4 text-read">{words('heard.lookedIn')}</h3>
      <ul className="mt-1 list-disc ps-6">
        {claim.lookedIn.map(({ title, on }) => (
          <li key={title}>{words('heard.looked', { title, date: sayDate(on) })}</li>
        ))}
      </ul>
    </>
  );
}
