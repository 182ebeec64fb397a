import { afterEach, beforeEach, expect, test } from 'vitest';
import { db } from '@/db/connection';
import { enqueueJob, findJob } from '@/db/jobs';
import { claimMail, enqueueMail, listMails, retryParkedMail, type NewMail } from '@/db/outbox';
import { inTransaction } from '@/db/transaction';
import { ok } from '@/lib/kernel/result';
import { makeMailer, type Mailer } from '@/lib/server/mailer';
import { newId } from '@/lib/server/new-id';
import type { JobHandler } from '@/lib/server/work/job-handler';
import { runDueJobs } from '@/lib/server/work/run-jobs';
import { ROUNDS } from '@/lib/server/work/rounds';
import { sendDueMails, type MailRoundEnd } from '@/lib/server/work/send-mails';
import { walkDueRounds } from '@/lib/server/work/walk-rounds';
import { runWorker } from '@/lib/server/work/worker';
import { openMailServer, type MailServer, type MailServerPlan } from '../builders/mail-server';

const NOW = new Date('2026-12-01T10:00:00Z');
const FROM = 'footring@footring.example.test';
const AT_ONCE = { baseMs: 0, mostMs: 0 };
const alive = new AbortController().signal;

let server: MailServer;
const mailers: Mailer[] = [];
async function withServer(plan: MailServerPlan = {}): Promise<void> {
  server = await openMailServer(plan);
}
const mailerTo = (url: string): Mailer => {
  const mailer = makeMailer({ url, from: FROM });
  mailers.push(mailer);
  return mailer;
};

beforeEach(async () => {
  for (const table of ['outbox', 'jobs', 'rounds', 'workers']) await db(table).del();
});
afterEach(async () => {
  for (const mailer of mailers.splice(0)) mailer.close();
  await server.close();
});

async function enqueue(address: string, over: Partial<NewMail> = {}): Promise<void> {
  await inTransaction(db, async (trx) => {
    const mail = { subject: 'Clay', text: 'Hello Mira,\n\nhttp://footring.example.test/reset/abc\n', html: '<p>Hello</p>' };
    await enqueueMail(trx, { accountId: null, address, mail, kind: 'reset-password', at: NOW, ...over });
    return ok(null);
  });
}

/** One look at the outbox by a worker of its own. */
const look = (url = server.url, worker = newId(NOW)): Promise<MailRoundEnd> =>
  sendDueMails({ db, worker, mailer: mailerTo(url), from: FROM, patience: AT_ONCE, signal: alive });

const states = async () =>
  Object.fromEntries(
    (await listMails(db, ['waiting', 'sending', 'sent', 'bounced', 'parked'], { limit: 100 })).map((mail) => [mail.address, mail]),
  );

test('OUT-3 many workers at one outbox send each mail once', async () => {
  await withServer();
  const addresses = Array.from({ length: 20 }, (_, number) => `maker${String(number)}@example.test`);
  for (const address of addresses) await enqueue(address);
  await Promise.all(
    Array.from({ length: 3 }, async () => {
      while ((await look()).tried > 0);
    }),
  );
  expect(server.received.flatMap(({ to }) => to).sort()).toEqual([...addresses].sort());
  expect(new Set(server.received.map(({ messageId }) => messageId)).size).toBe(20);
});

test('OUT-4 a mail whose worker is lost is sent by another, under the same Message-ID', async () => {
  const seen: string[] = [];
  await withServer({ onMail: ({ messageId }) => (seen.push(messageId) === 1 ? { code: 451, said: 'not now' } : null) });
  await enqueue('mira@example.test');
  await look();
  const id = String(await db('outbox').pluck('id'));
  const lost = newId(NOW);
  expect(await claimMail(db, { id, by: lost, forMs: 60_000 }, 'elsewhere.example.test')).toBe(true);
  expect(await claimMail(db, { id, by: newId(NOW), forMs: 60_000 }, 'elsewhere.example.test')).toBe(false);
  expect((await look()).tried).toBe(0); // while the claim holds
  await db('outbox')
    .where({ id })
    .update({ claimed_until: db.raw('UTC_TIMESTAMP(3)') });
  expect((await look()).tried).toBe(1);
  expect(server.received).toHaveLength(1);
  expect(seen).toEqual([`<${id}@footring.example.test>`, `<${id}@footring.example.test>`]);
});

test('OUT-5 F06 a refusal for good ends a mail at once; one for now is tried eight times, then waits for a steward; others flow', async () => {
  const tries = new Map<string, number>();
  await withServer({
    onRecipient: (address) => {
      tries.set(address, (tries.get(address) ?? 0) + 1);
      if (address.startsWith('gone')) return { code: 550, said: 'no such person' };
      return address.startsWith('grey') ? { code: 451, said: 'come back later' } : null;
    },
  });
  for (const address of ['gone@example.test', 'grey@example.test', 'mira@example.test']) await enqueue(address);
  while ((await look()).tried > 0);
  expect(await states()).toMatchObject({
    'gone@example.test': { state: 'bounced', tries: 1, lastAnswer: expect.stringContaining('550') as string },
    'grey@example.test': { state: 'parked', tries: 8, lastAnswer: expect.stringContaining('451') as string },
    'mira@example.test': { state: 'sent', tries: 1 },
  });
  expect(Object.fromEntries(tries)).toEqual({ 'gone@example.test': 1, 'grey@example.test': 8, 'mira@example.test': 1 });
  const parked = (await states())['grey@example.test']?.id ?? '';
  await inTransaction(db, async (trx) => ok(await retryParkedMail(trx, parked)));
  expect((await states())['grey@example.test']).toMatchObject({ state: 'waiting', tries: 0 });
});

test('OUT-6 F06 while the server is away no try is counted, however long that is', async () => {
  await withServer();
  await server.close();
  await enqueue('mira@example.test');
  for (let i = 0; i < 12; i += 1) expect(await look()).toEqual({ tried: 1, away: true });
  expect((await states())['mira@example.test']).toMatchObject({ state: 'waiting', tries: 0 });
  await withServer({ port: server.port });
  await look();
  expect(server.received).toHaveLength(1);
});

test('OUT-6 F06 a conversation that breaks off in this mail alone is counted', async () => {
  await withServer({ onMail: ({ to }) => (to[0] === 'poison@example.test' ? 'hang-up' : null) });
  await enqueue('poison@example.test');
  await enqueue('mira@example.test');
  while ((await look()).tried > 0);
  expect(await states()).toMatchObject({ 'poison@example.test': { state: 'parked', tries: 8 }, 'mira@example.test': { state: 'sent' } });
});

test('OUT-7 S38 one recipient, no header but ours, and mail that was asked for can be left', async () => {
  await withServer();
  const mail = { subject: 'Clay\r\nBcc: all@example.test', text: 'Hello\n.\nRCPT TO:<all@example.test>\n', html: '<p>Hello</p>' };
  await enqueue('mira@example.test', { mail, leaveUrl: 'http://footring.example.test/unsubscribe/abc' });
  for (const address of [
    'a@example.test, b@example.test',
    '"a@example.test,b"@example.test',
    'a@example.test\r\nBcc: b@example.test',
    '<a@example.test>',
  ]) {
    await enqueue(address);
  }
  while ((await look()).tried > 0);
  expect(server.received.map(({ to }) => to)).toEqual([['mira@example.test']]);
  const [head = ''] = server.received[0]?.source.split('\r\n\r\n') ?? [];
  const names = head
    .replace(/\r\n[ \t]+/g, ' ')
    .split('\r\n')
    .map((line) => line.slice(0, line.indexOf(':')).toLowerCase());
  expect(names.sort()).toEqual([
    'auto-submitted',
    'content-type',
    'date',
    'from',
    'list-unsubscribe',
    'list-unsubscribe-post',
    'message-id',
    'mime-version',
    'subject',
    'to',
  ]);
  expect(head).toContain('List-Unsubscribe: <http://footring.example.test/unsubscribe/abc>');
  expect(head).toContain('Auto-Submitted: auto-generated');
  const all = await listMails(db, ['bounced'], { limit: 10 });
  expect(all).toHaveLength(4);
});

test('OUT-7 a mail that nobody asked to get again names no way to leave', async () => {
  await withServer();
  await enqueue('mira@example.test');
  await look();
  expect(server.received[0]?.source).not.toMatch(/List-Unsubscribe/i);
});

test('OUT-8 once a mail is over its text is gone: it may hold a link that opens an account', async () => {
  await withServer({ onRecipient: (address) => (address.startsWith('gone') ? { code: 550, said: 'no' } : null) });
  await enqueue('mira@example.test');
  await enqueue('gone@example.test');
  await look();
  expect(await db('outbox').select('subject', 'body_text', 'body_html')).toEqual(
    Array.from({ length: 2 }, () => ({ subject: '', body_text: null, body_html: null })),
  );
});

const enqueueOne = async (kind: string): Promise<string> => {
  const made = await inTransaction(db, async (trx) => ok(await enqueueJob(trx, { kind, input: { n: 3 }, accountId: null, at: NOW })));
  return made.value;
};
const runJobs = (handlers: Readonly<Record<string, JobHandler>>, signal = alive, worker = newId(NOW)) =>
  runDueJobs({ db, worker, handlers, patience: AT_ONCE, signal });

test('SRV-5 a job is done by one worker, says how far it is, and keeps its result', async () => {
  await withServer();
  const id = await enqueueOne('count');
  let begun = 0;
  const count: JobHandler = async (_, input, report) => {
    begun += 1;
    await report(2, 3);
    expect(await findJob(db, id)).toMatchObject({ state: 'running', done: 2, total: 3 });
    return { heard: input };
  };
  const all = await Promise.all(Array.from({ length: 5 }, () => runJobs({ count })));
  expect(all.reduce((sum, one) => sum + one)).toBe(1);
  expect(begun).toBe(1);
  expect(await findJob(db, id)).toMatchObject({ state: 'done', tries: 1, result: { heard: { n: 3 } } });
});

test('SRV-6 a job that fails is tried eight times and then waits for a steward; one nobody knows waits at once', async () => {
  await withServer();
  const id = await enqueueOne('fails');
  const strange = await enqueueOne('toString');
  let begun = 0;
  const fails: JobHandler = () => {
    begun += 1;
    return Promise.reject(new TypeError('secret words'));
  };
  while ((await runJobs({ fails })) > 0);
  expect(begun).toBe(8);
  expect(await findJob(db, id)).toMatchObject({ state: 'parked', tries: 8, failure: 'TypeError' });
  expect(await findJob(db, strange)).toMatchObject({ state: 'parked', tries: 1 });
});

test('SRV-7 a worker that ends lets its job go, uncounted, and one whose claim ran out stops', async () => {
  await withServer();
  const id = await enqueueOne('long');
  const ending = new AbortController();
  const long: JobHandler = async (_, __, report) => {
    ending.abort();
    await report(1, 2);
    return null;
  };
  await runJobs({ long }, ending.signal);
  expect(await findJob(db, id)).toMatchObject({ state: 'waiting', tries: 0 });
  const overtaken: JobHandler = async (_, __, report) => {
    await db('jobs')
      .where({ id })
      .update({ claimed_by: newId(NOW) });
    await report(1, 2);
    return 'too late';
  };
  await runJobs({ long: overtaken });
  expect(await findJob(db, id)).toMatchObject({ state: 'running', result: null });
});

test('SRV-8 what is old is tidied away in its time, by one worker, and a round that fails keeps no other from being walked', async () => {
  await withServer();
  const old = new Date('2020-01-01T00:00:00Z');
  await db('request_keys').del();
  await db('limits').del();
  for (const [id, made_at] of [
    ['old', old],
    ['new', new Date()],
  ] as const) {
    await db('request_keys').insert({ id, who: 'guest', act: 'tests', input_hash: '0'.repeat(64), answer: 'null', made_at });
  }
  await db('limits').insert({ key: 'old', points: 1, expire: old.getTime() });
  await db('checks').insert({ id: 'O'.repeat(22), regions: '[]', answers: '{}', declined: '[]', begun_at: old, touched_at: old });
  await db('reading_sheets').insert({ id: 'O'.repeat(22), entry: '{}', touched_at: old });
  let walked = 0;
  const failing = { name: 'failing', everyMs: 1000, walk: () => Promise.reject(new Error('slip')) };
  const counting = { name: 'counting', everyMs: 60_000, walk: () => Promise.resolve((walked += 1)) };
  await Promise.all(Array.from({ length: 4 }, () => walkDueRounds(db, [failing, counting, ...ROUNDS], alive)));
  expect(walked).toBe(1);
  expect(await db('request_keys').pluck('id')).toEqual(['new']);
  for (const table of ['limits', 'checks', 'reading_sheets']) expect(await db(table).select('*'), table).toEqual([]);
});

test('SRV-9 a worker is seen while it works, and ends when it is told to', async () => {
  await withServer();
  await enqueue('mira@example.test');
  const ending = new AbortController();
  const worker = newId(NOW);
  const plan = { db, id: worker, mailer: mailerTo(server.url), from: FROM, mailPatience: AT_ONCE, handlers: {}, rounds: [] };
  const working = runWorker({ ...plan, signal: ending.signal });
  await server.until(1);
  expect(await db('workers').pluck('id')).toEqual([worker]);
  ending.abort();
  await working;
  expect(await db('workers').pluck('id')).toEqual([]);
  expect((await states())['mira@example.test']).toMatchObject({ state: 'sent' });
});
