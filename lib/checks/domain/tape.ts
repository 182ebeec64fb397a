import { NO, UNKNOWN, YES, type Tri } from '@/lib/kernel/tri';

/**
 * Conditions as one straight program over a stack of three-valued results, with a slot for each term, gate and rule.
 * It gives the Kleene value: quick, never wrong when it is definite, but sometimes "not known" although every completion agrees.
 */
export type Tape = { readonly code: Int32Array; readonly slots: number; readonly deepest: number };

const TEST = 0;
const PUSH = 1;
const LOAD = 2;
const STORE = 3;
const NOT = 4;
const LEAST = 5;
const MOST = 6;

/** Writes a tape, one instruction after another. */
export class TapeWriter {
  private readonly code: number[] = [];
  private depth = 0;
  private deepest = 0;
  private slots = 0;

  /** Pushes whether the variable lies in one of the cells of the mask. */
  test(variable: number, mask: number): void {
    this.code.push(TEST, variable, mask);
    this.move(1);
  }

  push(value: Tri): void {
    this.code.push(PUSH, value);
    this.move(1);
  }

  load(slot: number): void {
    this.code.push(LOAD, slot);
    this.move(1);
  }

  /** Takes the top into a new slot and says which. */
  store(): number {
    this.code.push(STORE, this.slots);
    this.move(-1);
    this.slots += 1;
    return this.slots - 1;
  }

  not(): void {
    this.code.push(NOT);
  }

  /** Replaces the topmost `count` by their minimum (`all`) or maximum (`any`). */
  join(kind: 'all' | 'any', count: number): void {
    if (count === 1) return;
    if (count === 0) {
      this.push(kind === 'all' ? YES : NO);
      return;
    }
    this.code.push(kind === 'all' ? LEAST : MOST, count);
    this.move(1 - count);
  }

  finish(): Tape {
    return { code: Int32Array.from(this.code), slots: this.slots, deepest: this.deepest };
  }

  private move(by: number): void {
    this.depth += by;
    this.deepest = Math.max(this.deepest, this.depth);
  }
}

/** Runs the tape on what is known: a mask of the cells still possible for each variable. Answers with the value of every slot. */
export function runTape(tape: Tape, masks: Int32Array): Int32Array {
  const { code } = tape;
  const slots = new Int32Array(tape.slots);
  const stack = new Int32Array(tape.deepest + 1);
  let top = -1;
  for (let here = 0; here < code.length; here += 1) {
    const instruction = code[here]!;
    if (instruction === NOT) {
      stack[top] = 2 - stack[top]!;
      continue;
    }
    here += 1;
    const operand = code[here]!;
    switch (instruction) {
      case TEST:
        here += 1;
        top += 1;
        stack[top] = compare(masks[operand]!, code[here]!);
        break;
      case PUSH:
        top += 1;
        stack[top] = operand;
        break;
      case LOAD:
        top += 1;
        stack[top] = slots[operand]!;
        break;
      case STORE:
        slots[operand] = stack[top]!;
        top -= 1;
        break;
      default:
        top -= operand - 1;
        stack[top] = extreme(stack, top, operand, instruction === LEAST ? NO : YES);
    }
  }
  return slots;
}

const compare = (possible: number, wanted: number): Tri => {
  if ((possible & ~wanted) === 0) return YES;
  return (possible & wanted) === 0 ? NO : UNKNOWN;
};

/** The value among `count` from `base` on that lies nearest to `end`. */
function extreme(stack: Int32Array, base: number, count: number, end: Tri): number {
  let value = stack[base]!;
  for (let next = base + 1; next < base + count; next += 1) {
    const other = stack[next]!;
    if (end === NO ? other < value : other > value) value = other;
  }
  return value;
}
