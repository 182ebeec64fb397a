import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';
import type { Contact } from '@/lib/regions/domain/sheet';
import type { SheetNames } from '@/lib/regions/domain/sheet-names';
import type { NamedContact } from '@/lib/regions/domain/sheet-reading';
import { MemoryMark } from './strength-line';

/** The name of somebody to ask, a link where we have an address. */
export function ContactName({ contact: { name, url } }: { readonly contact: Pick<Contact, 'name' | 'url'> }): ReactElement {
  return url === null ? <bdi>{name}</bdi> : <a href={url}>{name}</a>;
}

type Props = { readonly contacts: readonly NamedContact[]; readonly own: string; readonly names: SheetNames };

/** Authorities or accreditation bodies, the place's own before those of the layers above it. */
export function ContactList({ contacts, own, names }: Props): ReactElement {
  return (
    <ul className="mt-2 flex max-w-text flex-col gap-3">
      {contacts.map((contact, place) => (
        <li key={place} className="keep-together">
          <p className="font-strong">
            <ContactName contact={contact} />
          </p>
          <p className="flex flex-wrap gap-x-4 font-sans text-plain text-umber">
            <span>{contact.role}</span>
            {contact.region === own ? null : (
              <span>{words('regions.ask.fromAbove', { name: names.regions.get(contact.region) ?? contact.region })}</span>
            )}
            {contact.evidence === 'memory' ? <MemoryMark /> : null}
          </p>
        </li>
      ))}
    </ul>
  );
}
