import { compare, difference, readFraction, sum, whole, type Fraction } from '@/lib/kernel/fraction';
import type { Condition } from '@/lib/regions/domain/condition';
import type { MethodPayload, Rule, Tolerance } from '@/lib/regions/domain/rule';
import type { Conditions } from './reading';

/** What a method asks of a test. Several texts of one sheet must all be met. */
export type Method = {
  readonly temperaturesC: readonly Tolerance[];
  readonly hours: readonly Tolerance[];
  readonly light: NonNullable<MethodPayload['light']>;
  readonly hot: boolean;
  /** Nothing but whether it was run hot is asked. */
  readonly onlyHot: boolean;
};

/** What is asked where a sheet's method does not say. */
const USUAL = {
  temperatureC: { value: 22, plusMinus: 2 },
  hours: { value: 24, plusMinus: 0.5 },
  light: 'dark-if-cadmium',
} as const;
/** Cooking ware that China tests hot, by a method that gives no one temperature and time for all pieces. */
const TESTED_HOT = 'cn-cooking';

type LimitRule = Pick<Rule, 'region' | 'when'>;

/**
 * The method behind a limit: what the methods in its own sheet say, else those of the nearest
 * layer above it that has any. `methods` are those that may apply to the piece.
 */
export function methodFor(limit: LimitRule, methods: readonly Rule[], line: readonly string[]): Method {
  if (names(limit.when, TESTED_HOT)) return { temperaturesC: [], hours: [], light: 'any', hot: true, onlyHot: true };
  const fitting = methods.filter(({ when }) => !names(when, TESTED_HOT));
  const layers = line.slice(0, line.indexOf(limit.region) + 1).toReversed();
  const sheet = layers.find((layer) => fitting.some(({ region }) => region === layer));
  const payloads = fitting.flatMap(({ region, payload }) => (region === sheet && payload.topic === 'method' ? [payload] : []));
  const temperatures = payloads.flatMap(({ temperatureC }) => temperatureC ?? []);
  const hours = payloads.flatMap(({ hours: asked }) => asked ?? []);
  return {
    temperaturesC: temperatures.length === 0 ? [USUAL.temperatureC] : temperatures,
    hours: hours.length === 0 ? [USUAL.hours] : hours,
    light: lightOf(payloads),
    hot: payloads.some(({ hot }) => hot === true),
    onlyHot: false,
  };
}

/** Where texts differ, the one that asks most. */
function lightOf(payloads: readonly MethodPayload[]): Method['light'] {
  const asked = payloads.flatMap(({ light }) => light ?? []);
  return (['dark', 'dark-if-cadmium', 'any'] as const).find((light) => asked.includes(light)) ?? USUAL.light;
}

/** Whether a condition asks for a term, other than to be outside it. */
function names(condition: Condition, term: string): boolean {
  if (typeof condition === 'boolean' || 'not' in condition) return false;
  if ('all' in condition) return condition.all.some((part) => names(part, term));
  if ('any' in condition) return condition.any.some((part) => names(part, term));
  return 'term' in condition && condition.term === term;
}

/**
 * Whether a test was run otherwise than a method asks. What is not told counts as run as asked; the ends of a tolerance are
 * inside it. Where light matters only for cadmium, it matters for the whole test as soon as cadmium was read in it.
 */
export function isRunOtherwise(method: Method, told: Conditions, cadmiumRead: boolean): boolean {
  const { hot = method.hot } = told;
  if (method.onlyHot || hot !== method.hot) return hot !== method.hot;
  return (
    (told.dark === false && isDarkAsked(method, cadmiumRead)) ||
    isOutside(told.temperatureC, method.temperaturesC) ||
    isOutside(told.hours, method.hours)
  );
}

const isDarkAsked = ({ light }: Method, cadmiumRead: boolean): boolean => light === 'dark' || (light === 'dark-if-cadmium' && cadmiumRead);

function isOutside(told: number | undefined, asked: readonly Tolerance[]): boolean {
  if (told === undefined) return false;
  const figure = exact(told);
  return asked.some(({ value, plusMinus }) => {
    const [middle, margin] = [exact(value), exact(plusMinus)];
    return compare(figure, sum(middle, margin)) > 0 || compare(figure, difference(middle, margin)) < 0;
  });
}

const exact = (value: number): Fraction => readFraction(value) ?? whole(0n);
