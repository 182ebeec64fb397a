import type { ReactElement } from 'react';
import { DefinitionList } from '@/components/ui/definition-list';
import type { AccountRole } from '@/lib/access/domain/actor';
import { words } from '@/lib/kernel/words';

type Person = {
  readonly email: string;
  readonly name: string;
  readonly role: AccountRole;
  readonly password: string;
  readonly factor: { readonly secret: string; readonly code: string } | null;
};

/** The invented people of a demonstration, with all it takes to sign in as them. Nothing on a site that is in use. */
export function DemoPeople({ people }: { readonly people: readonly Person[] }): ReactElement | null {
  const [first] = people;
  if (first === undefined) return null;
  return (
    <section className="mt-12" aria-labelledby="demo">
      <h2 id="demo">{words('accounts.signIn.demo.title')}</h2>
      <p className="mt-3">{words('accounts.signIn.demo.lead')}</p>
      <p className="mt-3">
        {words('accounts.signIn.demo.password')}: <span className="code-text font-strong">{first.password}</span>
      </p>
      <p className="mt-3">{words('accounts.signIn.demo.codeLead')}</p>
      <ul className="mt-4" role="list">
        {people.map((person) => (
          <li key={person.email} className="py-3">
            <h3>
              {person.name}, {words(`accounts.role.${person.role}`)}
            </h3>
            <DefinitionList entries={entriesOf(person)} />
          </li>
        ))}
      </ul>
    </section>
  );
}

function entriesOf({ email, factor }: Person): readonly { id: string; name: string; value: ReactElement }[] {
  const text = (said: string): ReactElement => <span className="code-text">{said}</span>;
  const address = { id: 'email', name: words('accounts.signIn.demo.email'), value: text(email) };
  if (factor === null) return [address];
  return [
    address,
    { id: 'code', name: words('accounts.signIn.demo.code'), value: text(factor.code) },
    { id: 'secret', name: words('accounts.signIn.demo.secret'), value: text(factor.secret) },
  ];
}
