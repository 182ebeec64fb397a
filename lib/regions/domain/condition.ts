export type Threshold = { readonly value: number; readonly unit: string };

/**
 * When a rule applies or a term holds: a tree over questions. No operator asks whether an answer is known, so that one
 * more answer can never turn a settled verdict round. At most 4 deep and 40 leaves; longer texts become terms.
 */
export type Condition =
  | boolean
  | { readonly all: readonly Condition[] }
  | { readonly any: readonly Condition[] }
  | { readonly not: Condition }
  | { readonly question: string; readonly is: string | boolean }
  | { readonly question: string; readonly in: readonly string[] }
  | { readonly question: string; readonly lt: Threshold }
  | { readonly question: string; readonly le: Threshold }
  | { readonly question: string; readonly gt: Threshold }
  | { readonly question: string; readonly ge: Threshold }
  | { readonly question: string; readonly within: string }
  | { readonly term: string };
