/** The journeys need a site that runs; `npm test -- e2e` builds one, fills its database and starts it. */
export async function setup(): Promise<void> {
  const site = process.env['FOOTRING_SITE'];
  if (site === undefined || site === '')
    throw new Error('FOOTRING_SITE is not set: it names the site to try. `npm test -- e2e` starts one.');
  const answer = await fetch(new URL('/api/health', site));
  if (!answer.ok) throw new Error(`The site at ${site} is not well: /api/health answers ${answer.status}.`);
}
