import type { ReactElement } from 'react';
import type { ToldContact } from '@/lib/checks/domain/checklist';
import { words } from '@/lib/kernel/words';

type Props = {
  readonly authorities: readonly ToldContact[];
  readonly accreditation: readonly ToldContact[];
  readonly code: string;
  readonly placeNames: ReadonlyMap<string, string>;
};

/** The authorities of a place, the nearest first, and the bodies that keep lists of accredited labs. */
export function WhomToAsk({ authorities, accreditation, code, placeNames }: Props): ReactElement {
  const id = `${code}-ask`;
  return (
    <section className="mt-8" aria-labelledby={id}>
      <h2 id={id}>{words('checks.result.sections.ask')}</h2>
      {authorities.length === 0 ? <p>{words('checks.result.noAuthority')}</p> : <Contacts contacts={authorities} placeNames={placeNames} />}
      <p className="mt-4">{words('checks.result.lab')}</p>
      <Contacts contacts={accreditation} placeNames={placeNames} />
    </section>
  );
}

function Contacts({
  contacts,
  placeNames,
}: {
  readonly contacts: readonly ToldContact[];
  readonly placeNames: Props['placeNames'];
}): ReactElement {
  return (
    <ul className="mt-2 list-disc ps-6">
      {contacts.map(({ name, url, role, region, evidence }) => (
        <li key={`${region}-${name}`} className="keep-together py-1">
          {url === null ? (
            <bdi>{name}</bdi>
          ) : (
            <a href={url} className="address-in-print">
              {name}
            </a>
          )}{' '}
          – {role}
          <span className="block font-sans text-small text-umber">
            {placeNames.get(region) ?? region}
            {url === null ? `, ${words('checks.result.noAddress')}` : null}
            {evidence === 'memory' && url !== null ? `, ${words('checks.result.fromMemory')}` : null}
          </span>
        </li>
      ))}
    </ul>
  );
}
