import 'server-only';
import { randomUUID } from 'node:crypto';
import { headers } from 'next/headers';
import { redirect, unstable_rethrow } from 'next/navigation';
import type { z } from 'zod';
import type { Result } from '@/lib/kernel/result';
import { log } from './log';
import { ownOrigin } from './own-site';

export type Values = Readonly<Record<string, string | readonly string[]>>;

/** What a form shows: its key (one a submission, so that a double click is one act), what was typed, and what to mend. */
export type FormState = {
  readonly key: string;
  readonly values: Values;
  readonly errors: Readonly<Record<string, string>>;
  readonly tries: number;
};

export type FormAction<State> = (prev: State, form: FormData) => Promise<State>;

/** A form nobody has sent yet. */
export const freshForm = (values: Values = {}): FormState => ({ key: randomUUID(), values, errors: {}, tries: 0 });

/** An error whose number is both in the log and on the page that error.tsx draws. */
class Broken extends Error {
  constructor(
    readonly digest: string,
    cause: unknown,
  ) {
    super(digest, { cause });
  }
}

/** Whether a script sent this form. Without one the answer must be a page or a redirect. */
export const isScripted = async (): Promise<boolean> => (await headers()).has('next-action');

async function guard<Answer>(work: () => Promise<Answer>): Promise<Answer> {
  const asked = await headers();
  try {
    // Missing, null or foreign: Next itself lets some of these through.
    if (asked.get('origin') !== ownOrigin()) redirect('/broken?why=origin');
    return await work();
  } catch (error) {
    unstable_rethrow(error);
    const id = randomUUID();
    log.error({ id, error });
    if (await isScripted()) throw new Broken(id, error);
    redirect(`/broken?id=${id}`);
  }
}

/** Whoever calls an action by hand may send anything for its form: what is none is an empty one. */
const formOf = (sent: unknown): FormData => (sent instanceof FormData ? sent : new FormData());

/** The ground of every action with a state: asks where it came from, and turns what breaks into a page with a number. */
export function guarded<State>(work: FormAction<State>): FormAction<State> {
  return (prev, form) => guard(() => work(prev, formOf(form)));
}

/** The same for a form without a state, whose every end is a redirect. */
export function guardedForm(work: (form: FormData) => Promise<void>): (form: FormData) => Promise<void> {
  return (form) => guard(() => work(formOf(form)));
}

export type ActionPlan<Ctx, Input, Value, Refusal> = {
  readonly input: z.ZodType<Input>;
  /** Who asks, and when. Made anew for every call. */
  readonly context: () => Ctx | Promise<Ctx>;
  /** The use case. It asks permission itself. */
  readonly work: (ctx: Ctx, input: Input) => Promise<Result<Value, Refusal>>;
  /** Where an accepted form leads: a `redirect`, or a state to show. */
  readonly done: (value: Value, input: Input) => FormState | Promise<FormState>;
  /** The words of a refusal by field name; the key `form` is for what belongs to no field. */
  readonly say: (refusal: Refusal) => Readonly<Record<string, string>>;
  /** Keeps a refused entry and gives the address that shows it: without script the browser's Back would break otherwise. */
  readonly keep?: (state: FormState) => Promise<string>;
  /** Where a refusal leads that nothing in this form can mend: to sign in, to wait. Null: its words stand in the form. */
  readonly lead?: (refusal: Refusal, state: FormState) => Promise<string | null>;
};

/** Parses a form, runs its use case and shows refusals beside what was typed. Its words come from the schema and from `say`. */
export function defineAction<Ctx, Input, Value, Refusal>(plan: ActionPlan<Ctx, Input, Value, Refusal>): FormAction<FormState> {
  return guarded(async (prev, form) => {
    const values = valuesOf(form);
    const parsed = plan.input.safeParse(values);
    const typed = { prev, values: withoutSecrets(values) };
    if (!parsed.success) return refused(plan.keep, { ...typed, errors: errorsOf(parsed.error) });
    const result = await plan.work(await plan.context(), parsed.data);
    if (result.ok) return plan.done(result.value, parsed.data);
    const elsewhere = await plan.lead?.(result.error, stateOf({ ...typed, errors: {} }));
    if (typeof elsewhere === 'string') redirect(elsewhere);
    return refused(plan.keep, { ...typed, errors: plan.say(result.error) });
  });
}

type Refused = Pick<FormState, 'values' | 'errors'> & { readonly prev: unknown };

const stateOf = ({ prev, values, errors }: Refused): FormState => ({ key: keyOf(values), values, errors, tries: triesOf(prev) + 1 });

async function refused(keep: ((state: FormState) => Promise<string>) | undefined, given: Refused): Promise<FormState> {
  const state = stateOf(given);
  if (keep !== undefined && !(await isScripted())) redirect(await keep(state));
  return state;
}

/** Fields that are typed anew after a refusal: they go back into no page and are kept nowhere. */
const SECRET_FIELDS: ReadonlySet<string> = new Set(['password', 'current', 'code']);

const withoutSecrets = (values: Values): Values => Object.fromEntries(Object.entries(values).filter(([name]) => !SECRET_FIELDS.has(name)));

/** The state of the last try comes back from the browser, readable and changeable: only its count is read, and doubted. */
function triesOf(prev: unknown): number {
  const tries: unknown = typeof prev === 'object' && prev !== null && 'tries' in prev ? prev.tries : 0;
  return typeof tries === 'number' && Number.isSafeInteger(tries) && tries >= 0 && tries < 1000 ? tries : 0;
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;

function keyOf(values: Values): string {
  const key = values['key'];
  return typeof key === 'string' && UUID.test(key) ? key : randomUUID();
}

/** The fields of a form as text; a name that came several times as a list. Files go by /api, Next's own fields stay out. */
export function valuesOf(form: FormData): Values {
  const values = new Map<string, string | readonly string[]>();
  for (const name of new Set(form.keys())) {
    const given = form.getAll(name).filter((value): value is string => typeof value === 'string');
    const [first] = given;
    if (name.startsWith('$ACTION') || first === undefined) continue;
    values.set(name, given.length === 1 ? first : given);
  }
  return Object.fromEntries(values);
}

/** The first fault of each field, under the field's name. */
function errorsOf(error: z.ZodError): Readonly<Record<string, string>> {
  const errors = new Map<string, string>();
  for (const issue of error.issues) {
    const field = issue.path.length === 0 ? 'form' : String(issue.path[0]);
    if (!errors.has(field)) errors.set(field, issue.message);
  }
  return Object.fromEntries(errors);
}
