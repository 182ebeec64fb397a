import { words } from '@/lib/kernel/words';
import type { AnswerDoubtRefusal } from '@/lib/regions/answer-doubt';

const SAID: Readonly<Record<AnswerDoubtRefusal['kind'], () => string>> = {
  'not-found': () => words('doubts.fault.gone'),
  'doubt-moved-on': () => words('doubts.fault.doubt-moved-on'),
  'not-allowed': () => words('doubts.fault.not-allowed'),
  'key-reused': () => words('doubts.fault.key-reused'),
  busy: () => words('doubts.fault.busy'),
  'sign-in': () => words('doubts.fault.first'),
  'sign-in-again': () => words('doubts.fault.first'),
  'second-factor-needed': () => words('doubts.fault.first'),
  'confirm-first': () => words('doubts.fault.first'),
};

/** A refusal belongs to no field: it is said above the form. */
export const deskRefusalWords = ({ kind }: AnswerDoubtRefusal): Readonly<Record<string, string>> => ({ form: SAID[kind]() });
