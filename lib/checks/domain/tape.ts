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
/** A test that leaves its group if it alone decides it. */
const TEST_OR_LEAVE = 7;

/** Writes a tape, one instruction after another. */
export class TapeWriter {
  private readonly code: number[] = [];
  /** Where the last test begins; before the first, far from anything. */
  private lastTest = -9;
  private depth = 0;
  private deepest = 0;
  private slots = 0;

  /** Pushes whether the variable lies in one of the cells of the mask. */
  test(variable: number, mask: number): void {
    this.lastTest = this.code.length;
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

  /**
   * Writes parts one after another and joins them. Once a test among them alone decides, the rest are passed over: the result
   * is the same, since nothing lies below "no" or above "yes".
   */
  group<Part, Made>(kind: 'all' | 'any', parts: readonly Part[], write: (part: Part) => Made): readonly Made[] {
    const exits: number[] = [];
    const made = parts.map((part, before) => {
      if (before > 0 && this.lastTest === this.code.length - 3) exits.push(this.leave(kind, before));
      return write(part);
    });
    this.join(kind, parts.length);
    for (const exit of exits) this.code[exit] = this.code.length;
    return made;
  }

  finish(): Tape {
    return { code: Int32Array.from(this.code), slots: this.slots, deepest: this.deepest };
  }

  /** Lets the test just written leave a group of which it is the `count`th part. Answers with the place to say whereto. */
  private leave(kind: 'all' | 'any', count: number): number {
    this.code[this.lastTest] = TEST_OR_LEAVE;
    this.code.push(kind === 'all' ? NO : YES, count, 0);
    return this.code.length - 1;
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
  let here = 0;
  while (here < code.length) {
    const operand = code[here + 1]!;
    switch (code[here]!) {
      case TEST:
        top += 1;
        stack[top] = compare(masks[operand]!, code[here + 2]!);
        here += 3;
        break;
      case TEST_OR_LEAVE: {
        const value = compare(masks[operand]!, code[here + 2]!);
        const isDecided = value === code[here + 3]!;
        top -= isDecided ? code[here + 4]! - 2 : -1;
        stack[top] = value;
        here = isDecided ? code[here + 5]! : here + 6;
        break;
      }
      case PUSH:
        top += 1;
        stack[top] = operand;
        here += 2;
        break;
      case LOAD:
        top += 1;
        stack[top] = slots[operand]!;
        here += 2;
        break;
      case STORE:
        slots[operand] = stack[top]!;
        top -= 1;
        here += 2;
        break;
      case NOT:
        stack[top] = 2 - stack[top]!;
        here += 1;
        break;
      default:
        top -= operand - 1;
        stack[top] = extreme(stack, top, operand, code[here] === LEAST ? NO : YES);
        here += 2;
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
