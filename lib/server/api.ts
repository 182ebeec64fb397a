import 'server-only';
import { createHash, randomUUID } from 'node:crypto';
import type { z } from 'zod';
import { err, ok, type Result } from '@/lib/kernel/result';
import { words } from '@/lib/kernel/words';
import { takeApiCall } from './api-limit';
import { addressIn } from './client-address';
import { makeCtx } from './ctx';
import { readEnv } from './env';
import { log } from './log';
import { pointerTo, problemResponse, type Fault, type Problem, type ProblemKind } from './problem';
import { retryAfterOf } from './unavailable';

const LARGEST = 256 * 1024;
const DEEPEST = 20;

/** A refusal with its words from the message files. */
export function problem(kind: ProblemKind, errors?: readonly Fault[]): Problem {
  const said = { kind, title: words(`problems.${kind}.title`), detail: words(`problems.${kind}.detail`) };
  return errors === undefined ? said : { ...said, errors };
}

async function bodyText(request: Request): Promise<Result<string, Problem>> {
  if (Number(request.headers.get('content-length') ?? 0) > LARGEST) return err(problem('too-large'));
  const chunks: Uint8Array[] = [];
  let size = 0;
  // Counted while it streams: the length that a client declares binds nobody.
  for await (const value of request.body ?? []) {
    size += value.byteLength;
    if (size > LARGEST) return err(problem('too-large'));
    chunks.push(value);
  }
  try {
    return ok(new TextDecoder('utf-8', { fatal: true }).decode(Buffer.concat(chunks)));
  } catch {
    return err(problem('malformed'));
  }
}

/** How deep lists and objects lie in each other, counted without recursion; stops at `most`. */
function isDeeperThan(value: unknown, most: number): boolean {
  let level: unknown[] = [value];
  for (let depth = 0; level.length > 0; depth += 1) {
    if (depth > most) return true;
    level = level.flatMap((item): unknown[] => (typeof item === 'object' && item !== null ? Object.values(item) : []));
  }
  return false;
}

const faultsOf = (issues: readonly z.core.$ZodIssue[]): readonly Fault[] =>
  issues.flatMap((issue) =>
    issue.code === 'unrecognized_keys'
      ? issue.keys.map((key) => ({ pointer: pointerTo([...issue.path, key]), detail: words('problems.unknown-field', { field: key }) }))
      : [{ pointer: pointerTo(issue.path), detail: issue.message }],
  );

/** The body of an API request, read through a schema, or the problem to answer with. */
export async function readBody<T>(request: Request, schema: z.ZodType<T>): Promise<Result<T, Problem>> {
  const type = (request.headers.get('content-type') ?? '').split(';')[0]?.trim().toLowerCase();
  if (type !== 'application/json') return err(problem('not-json'));
  const text = await bodyText(request);
  if (!text.ok) return text;
  let raw: unknown;
  try {
    raw = JSON.parse(text.value);
  } catch {
    return err(problem('malformed'));
  }
  if (isDeeperThan(raw, DEEPEST))
    return err(problem('not-understood', [{ pointer: '', detail: words('problems.too-deep', { most: DEEPEST }) }]));
  return readValue(raw, schema);
}

/** A value through a schema, or a 422 with one pointer a fault. `at` is put before each pointer. */
export function readValue<T>(raw: unknown, schema: z.ZodType<T>, at: readonly PropertyKey[] = []): Result<T, Problem> {
  const parsed = schema.safeParse(raw);
  if (parsed.success) return ok(parsed.data);
  const faults = faultsOf(parsed.error.issues).map((fault) => ({ ...fault, pointer: pointerTo(at) + fault.pointer }));
  return err(problem('not-understood', faults));
}

/** A JSON reply that any site may read; a read carries a strong ETag of its content and answers 304 when it is known. */
export function jsonResponse(request: Request, body: unknown): Response {
  const text = JSON.stringify(body);
  const headers = new Headers({ 'access-control-allow-origin': '*', 'cache-control': 'no-store' });
  if (request.method === 'GET' || request.method === 'HEAD') {
    const tag = `"${createHash('sha256').update(text).digest('hex').slice(0, 32)}"`;
    headers.set('etag', tag);
    headers.set('cache-control', 'no-cache');
    if (knows(request, tag)) return new Response(null, { status: 304, headers });
  }
  headers.set('content-type', 'application/json');
  return new Response(text, { headers });
}

const knows = (request: Request, tag: string): boolean =>
  (request.headers.get('if-none-match') ?? '')
    .split(',')
    .map((known) => known.trim().replace(/^W\//, ''))
    .some((known) => known === tag || known === '*');

/** Runs a handler of the public API: counts the request against its address first, then as `answering`. */
export async function counted(request: Request, work: () => Promise<Response>): Promise<Response> {
  return answering(async () => {
    const taken = await takeApiCall(addressIn(request.headers, readEnv().proxies), makeCtx());
    if (taken.ok) return work();
    return problemResponse({ ...problem('too-many'), retryAfterS: taken.error.retryAfterS });
  });
}

/**
 * Runs a handler. What breaks is logged under an id and answered with that id alone; when the database was too slow or away, the
 * answer says when to try again.
 */
export async function answering(work: () => Promise<Response>): Promise<Response> {
  try {
    return await work();
  } catch (error) {
    const id = randomUUID();
    log.error({ id, error });
    const retryAfterS = retryAfterOf(error);
    if (retryAfterS !== null) return problemResponse({ ...problem('unavailable'), retryAfterS });
    const { title, detail } = problem('broken');
    return problemResponse({ kind: 'broken', title, detail: `${detail} (${id})` });
  }
}

/** Answers a browser's question before a cross-site call: reads and checks are open to every site, without cookies. */
export function preflight(methods: string): Response {
  return new Response(null, {
    status: 204,
    headers: {
      'access-control-allow-origin': '*',
      'access-control-allow-methods': methods,
      'access-control-allow-headers': 'content-type, if-none-match',
      'access-control-max-age': '86400',
    },
  });
}
