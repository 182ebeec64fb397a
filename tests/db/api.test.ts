import { beforeAll, expect, test } from 'vitest';
import { GET as health } from '@/app/api/health/route';
import { POST } from '@/app/api/v1/checks/route';
import { GET as getRegions } from '@/app/api/v1/regions/route';
import { GET as getRegion } from '@/app/api/v1/regions/[code]/route';
import { GET as getEditions } from '@/app/api/v1/regions/[code]/editions/route';
import { GET as getRule } from '@/app/api/v1/rules/[id]/route';
import { z } from 'zod';
import { foundSheets } from './founding';

const AT = 'http://localhost:3000/api/v1';
const post = (body: unknown, headers: Record<string, string> = { 'content-type': 'application/json' }) =>
  POST(new Request(`${AT}/checks`, { method: 'POST', headers, body: typeof body === 'string' ? body : JSON.stringify(body) }));

const rule = z.looseObject({ id: z.string(), status: z.string(), sources: z.array(z.looseObject({})) });
const reply = z.looseObject({
  regions: z.array(z.looseObject({ code: z.string(), rules: z.array(rule) })),
  copy: z.string(),
  caution: z.string(),
});
const problem = z.looseObject({ status: z.number(), errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional() });

async function faults(body: unknown): Promise<z.output<typeof problem>> {
  const response = await post(body);
  expect(response.headers.get('content-type')).toBe('application/problem+json');
  const told = problem.parse(await response.json());
  expect(told.status).toBe(response.status);
  return told;
}
const pointers = async (body: unknown) => (await faults(body)).errors?.map(({ pointer }) => pointer);

beforeAll(foundSheets);

const MUG = {
  use: 'food',
  form: 'mug',
  'holds-liquid': true,
  'depth-mm': 95,
  'capacity-ml': 350,
  'cooked-in': false,
  'packaging-or-storage': false,
  contact: ['acidic', 'hot-drink'],
  inside: 'glazed',
  'peak-c': 1240,
};

test('API-1 the same request gives the same reply to the byte, and stores nothing unless asked', async () => {
  const body = { regions: ['dk', 'us-ca'], on: '2026-12-01', answers: MUG };
  const [one, two] = await Promise.all([post(body), post(body)]);
  expect(await one.text()).toBe(await two.text());
  const { db } = await import('@/db/connection');
  expect(await db('copies').pluck('hash')).toEqual([]);
  const kept = reply.parse(await (await post({ ...body, keep: true })).json());
  expect(await db('copies').pluck('hash')).toEqual([kept.copy]);
});

test('API-2 the order of answers, options and members does not change the copy it is kept under', async () => {
  const backwards = Object.fromEntries(Object.entries(MUG).reverse());
  const hash = async (answers: unknown) => reply.parse(await (await post({ regions: ['dk'], on: '2026-12-01', answers })).json()).copy;
  expect(await hash(backwards)).toBe(await hash(MUG));
});

test('API-3 each fault is told with its place and what would mend it', async () => {
  expect(await pointers({ regions: ['dk'], answers: { 'depth-mm': '95' } })).toEqual(['/answers/depth-mm']);
  expect(await pointers({ regions: ['dk'], answers: { colour: 'blue' }, colour: 1 })).toEqual(['/answers/colour', '/colour']);
  expect(await pointers({ regions: ['dk'], answers: { form: 'chalice', contact: ['none', 'wet'], crazed: 'no' } })).toHaveLength(3);
  expect(await pointers({ regions: [] })).toEqual(['/regions']);
  expect(await pointers({ regions: ['dk'], on: '2026-02-30' })).toEqual(['/on']);
  expect(await pointers({ regions: ['dk'], declined: ['depth'] })).toEqual(['/declined/0']);
  expect(await pointers({ regions: ['dk'], answers: { use: 'food' }, declined: ['use'] })).toEqual(['/declined/0']);
  expect(await pointers({ regions: ['dk'], answers: { 'turnover-a-year': { amount: 120, currency: 'eur' } } })).toHaveLength(1);
  expect(await pointers({ regions: ['dk'], answers: { 'depth-mm': -1 } })).toEqual(['/answers/depth-mm']);
  expect(await pointers([1])).toEqual(['']);
});

test('API-4 a place without a sheet is not found, and the base layer is no place', async () => {
  expect(await faults({ regions: ['dk', 'zz'] })).toMatchObject({ status: 404, errors: [{ pointer: '/regions/1' }] });
  expect(await faults({ regions: ['care'] })).toMatchObject({ status: 404 });
});

test('API-5 what is no JSON, too large, too deep or of another type is refused with its own status', async () => {
  const status = async (body: unknown, headers?: Record<string, string>) => (await post(body, headers)).status;
  expect(await status('{"regions":')).toBe(400);
  expect(await status('{}', { 'content-type': 'text/plain' })).toBe(415);
  expect(await status(JSON.stringify({ regions: ['dk'], answers: {}, note: 'x'.repeat(300_000) }))).toBe(413);
  expect(await status(`{"regions":${'['.repeat(5000)}${']'.repeat(5000)}}`)).toBe(422);
  expect(await status('{"regions":["dk"],"answers":{"depth-mm":1e999}}')).toBe(422);
  const bytes = new Request(`${AT}/checks`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: new Uint8Array([0x7b, 0xff, 0x7d]),
  });
  expect((await POST(bytes)).status).toBe(400);
});

test('API-6 a body that says it is small and is not is stopped while it streams', async () => {
  let sent = 0;
  const body = new ReadableStream({
    pull(controller) {
      sent += 65_536;
      controller.enqueue(new Uint8Array(65_536).fill(0x20));
      if (sent > 100 * 65_536) controller.close();
    },
  });
  const init = {
    method: 'POST',
    headers: { 'content-type': 'application/json', 'content-length': '12' },
    body,
    duplex: 'half',
  };
  const request = new Request(`${AT}/checks`, init);
  expect((await POST(request)).status).toBe(413);
  expect(sent).toBeLessThan(10 * 65_536);
});

test('API-7 reads carry a strong tag and answer 304 when it is known; any site may read them', async () => {
  const first = await getRegions(new Request(`${AT}/regions`));
  const tag = first.headers.get('etag') ?? '';
  expect(tag).toMatch(/^"[0-9a-f]+"$/);
  expect(first.headers.get('access-control-allow-origin')).toBe('*');
  const again = await getRegions(new Request(`${AT}/regions`, { headers: { 'if-none-match': tag } }));
  expect(again.status).toBe(304);
  expect(await again.text()).toBe('');
});

test('API-8 regions, a sheet on a day, its editions and a rule are told as documented', async () => {
  const of = (key: string, value: string) => ({ params: Promise.resolve({ [key]: value }) as Promise<never> });
  const regions = z
    .object({ regions: z.array(z.looseObject({ code: z.string() })) })
    .parse(await (await getRegions(new Request(AT))).json());
  expect(regions.regions.find(({ code }) => code === 'dk')).toMatchObject({
    kind: 'country',
    line: ['eu', 'dk'],
    edition: 1,
    limits: 'read',
  });
  expect(regions.regions.map(({ code }) => code)).not.toContain('care');
  const sheet: unknown = await (await getRegion(new Request(`${AT}/regions/dk?on=2026-12-01`), of('code', 'dk'))).json();
  expect(sheet).toMatchObject({ code: 'dk', line: ['eu', 'dk'], on: '2026-12-01', edition: 1 });
  const members = ['code', 'name', 'line', 'on', 'edition', 'text', 'rules', 'terms', 'authorities', 'accreditation', 'gaps', 'caution'];
  expect(Object.keys(z.looseObject({}).parse(sheet))).toEqual(expect.arrayContaining(members));
  const editions: unknown = await (await getEditions(new Request(AT), of('code', 'dk'))).json();
  expect(editions).toMatchObject({ editions: [{ number: 1, inUseTo: null, summary: 'Founding sheet' }] });
  const found: unknown = await (await getRule(new Request(AT), of('id', 'dk-register'))).json();
  expect(found).toMatchObject({ id: 'dk-register', topic: 'registration', edition: 1, strength: 'must', standing: 'law' });
  expect((await getRule(new Request(AT), of('id', 'dk-nothing'))).status).toBe(404);
  expect((await getRegion(new Request(`${AT}/regions/dk?on=yesterday`), of('code', 'dk'))).status).toBe(422);
});

test('API-9 health says so when the database answers', async () => {
  const response = await health();
  expect(response.status).toBe(200);
  expect(await response.json()).toMatchObject({ status: 'ok', database: 'ok' });
});

test('API-10 every reply with a result carries the caution and sends its reader to the authority and to an accredited lab', async () => {
  const { caution } = reply.parse(await (await post({ regions: ['dk'], answers: MUG })).json());
  expect(caution).toMatch(/^This list is not proof\./);
  expect(caution).toMatch(/Fødevarestyrelsen.* before you sell, and have the piece tested by a lab accredited/);
});
