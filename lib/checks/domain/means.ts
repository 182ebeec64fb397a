import type { QuestionId } from './questions';

/** What it takes to find something out, cheapest first. */
export const MEANS = ['known', 'look', 'ruler', 'scales', 'boil-test', 'papers', 'lab'] as const;
export type Means = (typeof MEANS)[number];

/** Whatever is not named here the maker knows or decides. */
const BY_QUESTION: Partial<Record<QuestionId, Means>> = {
  'holds-liquid': 'look',
  'unfit-by-design': 'look',
  'depth-mm': 'ruler',
  'rim-decorated': 'ruler',
  'capacity-ml': 'scales',
  'packaging-kg-a-year': 'scales',
  'absorption-percent': 'boil-test',
  inside: 'look',
  'outside-glazed': 'look',
  surface: 'look',
  crazed: 'look',
  'metal-parts': 'papers',
  heat: 'papers',
  body: 'papers',
  colourants: 'papers',
  'lead-or-cadmium-in-materials': 'papers',
  'materials-documented': 'papers',
  sealed: 'papers',
  'turnover-a-year': 'papers',
  'cross-border-turnover-a-year': 'papers',
  'consignment-value': 'papers',
  'lead-history': 'lab',
};

const BY_ID = new Map<string, Means>(Object.entries(BY_QUESTION));

/** How a question is found out. */
export const meansOf = (question: string): Means => BY_ID.get(question) ?? 'known';
