/** Three truth values of strong Kleene logic (Kleene 1952): no < not known < yes. `all` is min, `any` is max, `not` is 2 − x. */
export type Tri = 0 | 1 | 2;

export const NO: Tri = 0;
export const UNKNOWN: Tri = 1;
export const YES: Tri = 2;
