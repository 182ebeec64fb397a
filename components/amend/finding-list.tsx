import type { ReactElement } from 'react';
import { Badge } from '@/components/ui/badge';
import { sayFinding } from '@/lib/checks/domain/finding-words';
import type { Finding } from '@/lib/checks/domain/finding';
import { words } from '@/lib/kernel/words';
import type { Sheet } from '@/lib/regions/domain/sheet';

type Props = {
  readonly findings: readonly Finding[];
  /** The author's page of the amendment. */
  readonly page: string;
  readonly contacts: Pick<Sheet, 'authorities' | 'accreditation'>;
};

/** What the checks found, errors first, each with the way to where it is mended. */
export function FindingList({ findings, page, contacts }: Props): ReactElement {
  const sorted = [...findings.filter(({ level }) => level === 'error'), ...findings.filter(({ level }) => level !== 'error')];
  return (
    <section className="amend-section" aria-labelledby="findings">
      <h2 id="findings">{words('amend.check.findings')}</h2>
      {sorted.length === 0 ? <p className="mt-2">{words('amend.check.findingsNone')}</p> : null}
      <ul className="mt-3" role="list">
        {sorted.map((finding, place) => (
          <FindingLine key={place} finding={finding} href={placeOf(finding, page, contacts)} />
        ))}
      </ul>
    </section>
  );
}

function FindingLine({ finding, href }: { readonly finding: Finding; readonly href: string | null }): ReactElement {
  const { level, where, text } = sayFinding(finding);
  return (
    <li className="border-b border-rule py-3">
      <p>
        <Badge colour={finding.level === 'error' ? 'copper' : 'plain'}>{level}</Badge> {href === null ? where : <a href={href}>{where}</a>}
      </p>
      <p>{text}</p>
    </li>
  );
}

/** The form that can mend it, at the field where it has one of that name. */
function placeOf({ at: { list, id, field } }: Finding, page: string, contacts: Props['contacts']): string | null {
  switch (list) {
    case 'rules':
    case 'terms':
    case 'sources':
    case 'trials':
    case 'memberships':
      return id === '' ? null : `${page}/${list}/${encodeURIComponent(id)}${anchorOf(field)}`;
    case 'authorities':
    case 'accreditation': {
      const place = contacts[list].findIndex(({ name }) => name === id);
      return place === -1 ? null : `${page}/${list}/${String(place + 1)}`;
    }
    case 'gaps':
      return `${page}/gaps`;
    case 'sheet':
      return `${page}/place`;
    case 'leftOut':
      return null;
  }
}

const anchorOf = (field: string): string => {
  if (field === 'when') return '#part-condition';
  return /^[a-zA-Z0-9.-]+$/.test(field) ? `#${field === 'sources' ? 'part-sources' : field}` : '';
};
