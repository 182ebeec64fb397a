/* Makes an account a steward: npm run steward -- mara@example.test. The first one of a site has nobody else to ask. */
import { db } from '../db/connection';
import { makeSteward } from '../lib/accounts/make-steward';
import { email } from '../lib/accounts/schema';
import { env } from '../lib/server/env';

const SAID = {
  made: 'This account is a steward now. Before they can act, they set up a second step to sign in.',
  'was-one': 'This account is a steward already.',
  begun: 'There was no such account: one was begun. A mail with a link to set a password is on its way to that address.',
  closed: 'This account is closed or leaving. Nothing was changed.',
} as const;

try {
  const given = email.safeParse(process.argv[2] ?? '');
  if (given.success) {
    const made = await makeSteward({ db, now: new Date(), site: env.site }, { email: given.data });
    console.log(SAID[made.ok ? made.value.what : made.error.kind]);
    process.exitCode = made.ok ? 0 : 1;
  } else {
    console.error('Give one e-mail address: npm run steward -- mara@example.test');
    process.exitCode = 2;
  }
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 1;
} finally {
  await db.destroy();
}
