/** A mutant that changes nothing anybody can see, with the reason. `original` and `mutated` are as the list of survivors prints them. */
export type Equivalent = { readonly file: string; readonly original: string; readonly mutated: string; readonly because: string };

const NEVER = 'a guard for the compiler: what it guards against cannot be';
const SLOWER = 'only remembers what would be worked out again, to the same end';

/** `(removed)` in the list is an empty text here. */
export const EQUIVALENT: readonly Equivalent[] = [
  { file: 'cells.ts', original: "if (cut.kind !== 'money' || currency === null) return [];", mutated: '', because: NEVER },
  {
    file: 'compile-condition.ts',
    original: 'cut === undefined || cut === null',
    mutated: 'cut === undefined && cut === null',
    because: NEVER,
  },
  {
    file: 'judge.ts',
    original: 'question === undefined || answer === undefined',
    mutated: 'question === undefined && answer === undefined',
    because: NEVER,
  },
  { file: 'line-build.ts', original: 'continue;', mutated: '', because: NEVER },
  { file: 'exact-status.ts', original: 'this.round[node] = this.now;', mutated: '', because: SLOWER },
  { file: 'diagram-builder.ts', original: 'if (known !== undefined) return known;', mutated: '', because: SLOWER },
  {
    file: 'diagram-builder.ts',
    original: 'absorbing === NEVER',
    mutated: 'absorbing !== NEVER',
    because: 'the two memories change places',
  },
  {
    file: 'diagram-builder.ts',
    original: 'Math.min(this.store.variable[a]!, this.store.variable[b]!)',
    mutated: 'Math.max(this.store.variable[a]!, this.store.variable[b]!)',
    because: 'all diagrams are ordered from the last variable to the first, and as canonical as before',
  },
  {
    file: 'diagram.ts',
    original: 'length <= array.length',
    mutated: 'length < array.length',
    because: 'an array grows one element earlier',
  },
  {
    file: 'diagram.ts',
    original: '2 * this.size',
    mutated: '2 + this.size',
    because: 'the table of nodes is filled further before it grows',
  },
  {
    file: 'reason.ts',
    original: 'variable < masks.length',
    mutated: 'variable <= masks.length',
    because: 'no question owns the variable after the last',
  },
  { file: 'tape.ts', original: '1 - count', mutated: '1 + count', because: 'the stack is made larger than it need be' },
];
