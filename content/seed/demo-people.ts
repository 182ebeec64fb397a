import type { AccountRole } from '@/lib/access/domain/actor';
import type { Preferences } from '@/lib/accounts/domain/account';

/** An invented person of the demonstration. Everything here is shown to everybody, the password too. */
export type DemoPerson = {
  readonly email: string;
  readonly name: string;
  readonly role: AccountRole;
  readonly preferences: Preferences;
  /** The secret of the second step in base32, for roles that need one. */
  readonly factorSecret: string | null;
};

export const DEMO_PASSWORD = 'turn the foot ring slowly';

const metric = (region: string, currency: string): Preferences => ({ region, currency, units: 'metric' });

export const DEMO_PEOPLE: readonly DemoPerson[] = [
  { email: 'mette.holmgaard@example.test', name: 'Mette Holmgaard', role: 'maker', preferences: metric('dk', 'DKK'), factorSecret: null },
  {
    email: 'owen.tallis@example.test',
    name: 'Owen Tallis',
    role: 'editor',
    preferences: { region: 'us-ca', currency: 'USD', units: 'imperial' },
    factorSecret: null,
  },
  {
    email: 'ines.carvalhal@example.test',
    name: 'Inês Carvalhal',
    role: 'moderator',
    preferences: metric('eu', 'EUR'),
    factorSecret: 'GEZDGNBVGY3TQOJQGEZDGNBVGY3TQOJQ',
  },
  {
    email: 'haruto.ishimori@example.test',
    name: 'Haruto Ishimori',
    role: 'moderator',
    preferences: metric('jp', 'JPY'),
    factorSecret: 'MFRGGZDFMZTWQ2LKNNWG23TPOBYXE43U',
  },
  {
    email: 'ruth.abercorn@example.test',
    name: 'Ruth Abercorn',
    role: 'moderator',
    preferences: metric('gb', 'GBP'),
    factorSecret: 'OB2HIZLSOMQGWZLFOAQHI2DFNEQG65LS',
  },
  {
    email: 'tomasz.wierzba@example.test',
    name: 'Tomasz Wierzba',
    role: 'steward',
    preferences: metric('de', 'EUR'),
    factorSecret: 'ONXW2ZJANNUWY3TTEBTG64RAMFWGY5LT',
  },
];
