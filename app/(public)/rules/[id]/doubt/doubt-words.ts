import { words } from '@/lib/kernel/words';
import type { DoubtRefusal } from '@/lib/regions/raise-doubt';

const SAID: Readonly<Record<DoubtRefusal['kind'], () => string>> = {
  'too-quick': () => words('doubts.fault.too-quick'),
  'too-old': () => words('doubts.fault.too-old'),
  'not-found': () => words('doubts.fault.not-found'),
  'too-many': () => words('doubts.fault.too-many'),
  'not-allowed': () => words('doubts.fault.not-allowed'),
  'sign-in': () => words('doubts.fault.first'),
  'sign-in-again': () => words('doubts.fault.first'),
  'second-factor-needed': () => words('doubts.fault.first'),
  'confirm-first': () => words('doubts.fault.first'),
};

/** What each refusal says, at the field of the words. */
export const doubtRefusalWords = ({ kind }: DoubtRefusal): Readonly<Record<string, string>> => ({ words: SAID[kind]() });
