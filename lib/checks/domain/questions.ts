import type { Unit } from '@/lib/kernel/quantity';

/** Topics group the questions for the reader, in this order. */
export const TOPICS = ['use', 'form', 'food', 'making', 'materials', 'tests', 'selling', 'scale'] as const;
export type Topic = (typeof TOPICS)[number];

type Of<Kind extends string> = { readonly id: string; readonly topic: Topic; readonly kind: Kind };
export type Gate = { readonly question: string; readonly in: readonly string[] };

/** What one can be asked about a piece or its sale. Open to other lists than ours, so that tests can invent their own. */
export type Question = (
  | Of<'yesno'>
  | (Of<'choice'> & { readonly options: readonly string[] })
  | (Of<'several'> & { readonly options: readonly string[] })
  | (Of<'amount'> & { readonly unit: Unit })
  | Of<'money'>
  | Of<'region'>
) & { readonly askIf?: Gate };

/** Every question of product section 6, in the order of asking. `none` of a `several` is the empty list, no option of its own. */
export const QUESTIONS = [
  { id: 'use', topic: 'use', kind: 'choice', options: ['food', 'decorative'] },
  { id: 'could-hold-food', topic: 'use', kind: 'yesno' },
  { id: 'unfit-by-design', topic: 'use', kind: 'yesno' },
  {
    id: 'form',
    topic: 'form',
    kind: 'choice',
    // prettier-ignore
    options: ['plate', 'saucer', 'platter', 'bowl', 'mug', 'cup', 'tumbler', 'jug', 'creamer', 'teapot', 'coffee-pot', 'jar', 'bottle',
      'baking-dish', 'casserole', 'spoon-rest', 'tile', 'vase', 'ornament', 'other'],
  },
  { id: 'holds-liquid', topic: 'form', kind: 'yesno' },
  { id: 'depth-mm', topic: 'form', kind: 'amount', unit: 'mm' },
  { id: 'capacity-ml', topic: 'form', kind: 'amount', unit: 'mL' },
  { id: 'drinking-rim', topic: 'form', kind: 'yesno' },
  { id: 'rim-decorated', topic: 'form', kind: 'yesno' },
  { id: 'lidded', topic: 'form', kind: 'yesno' },
  { id: 'metal-parts', topic: 'form', kind: 'yesno' },
  {
    id: 'contact',
    topic: 'food',
    kind: 'several',
    options: ['dry-wrapped', 'dry', 'wet', 'acidic', 'fatty', 'hot-drink', 'alcohol', 'storage-over-24-h'],
  },
  { id: 'heat', topic: 'food', kind: 'several', options: ['microwave', 'oven', 'hob', 'dishwasher', 'reheating'] },
  { id: 'cooked-in', topic: 'food', kind: 'yesno' },
  { id: 'packaging-or-storage', topic: 'food', kind: 'yesno' },
  { id: 'for-children', topic: 'food', kind: 'yesno' },
  { id: 'one-off', topic: 'food', kind: 'yesno' },
  { id: 'body', topic: 'making', kind: 'choice', options: ['earthenware', 'stoneware', 'porcelain', 'bone-china', 'other'] },
  {
    id: 'firing',
    topic: 'making',
    kind: 'choice',
    options: ['electric', 'gas', 'wood', 'salt-or-soda', 'raku', 'pit-or-smoke', 'other'],
  },
  { id: 'peak-c', topic: 'making', kind: 'amount', unit: 'C' },
  { id: 'inside', topic: 'making', kind: 'choice', options: ['glazed', 'partly-glazed', 'unglazed'] },
  { id: 'outside-glazed', topic: 'making', kind: 'yesno' },
  {
    id: 'surface',
    topic: 'making',
    kind: 'several',
    options: ['gloss', 'matt', 'crackle', 'textured', 'pinholed', 'cracked'],
  },
  { id: 'crazed', topic: 'making', kind: 'yesno', askIf: { question: 'inside', in: ['glazed', 'partly-glazed'] } },
  {
    id: 'colourants',
    topic: 'materials',
    kind: 'several',
    // prettier-ignore
    options: ['iron', 'cobalt', 'copper', 'chromium', 'manganese', 'nickel', 'vanadium', 'barium', 'lithium', 'zinc', 'cadmium-selenium',
      'lead', 'antimony', 'uranium', 'stain', 'lustre-or-gold', 'overglaze-enamel'],
  },
  { id: 'unfired-finish', topic: 'materials', kind: 'yesno' },
  { id: 'lead-or-cadmium-in-materials', topic: 'materials', kind: 'yesno' },
  { id: 'materials-documented', topic: 'materials', kind: 'yesno' },
  { id: 'lead-history', topic: 'materials', kind: 'yesno' },
  {
    id: 'sealed',
    topic: 'materials',
    kind: 'choice',
    options: ['none', 'wax-or-oil', 'silica-sealer', 'resin', 'other'],
  },
  { id: 'absorption-percent', topic: 'materials', kind: 'amount', unit: 'percent' },
  { id: 'lab-tested', topic: 'tests', kind: 'choice', options: ['no', 'home-test-only', 'accredited-lab'] },
  { id: 'changed-since-test', topic: 'tests', kind: 'yesno' },
  { id: 'firing-recorded', topic: 'tests', kind: 'yesno' },
  {
    id: 'claims',
    topic: 'tests',
    kind: 'several',
    options: ['food-use', 'lead-free', 'origin', 'microwave-or-oven'],
  },
  { id: 'seller-region', topic: 'selling', kind: 'region' },
  {
    id: 'channel',
    topic: 'selling',
    kind: 'choice',
    options: ['own-studio', 'market-stall', 'online-direct', 'marketplace', 'shop-or-gallery', 'wholesale', 'food-business'],
  },
  { id: 'importer', topic: 'selling', kind: 'choice', options: ['maker', 'buyer-for-own-use', 'dealer'] },
  { id: 'carrier', topic: 'selling', kind: 'choice', options: ['post', 'courier', 'freight', 'in-person'] },
  { id: 'ioss', topic: 'selling', kind: 'yesno' },
  { id: 'ships-packed', topic: 'selling', kind: 'yesno' },
  { id: 'pieces-a-year', topic: 'scale', kind: 'amount', unit: 'pieces' },
  { id: 'turnover-a-year', topic: 'scale', kind: 'money' },
  { id: 'cross-border-turnover-a-year', topic: 'scale', kind: 'money' },
  { id: 'packaging-kg-a-year', topic: 'scale', kind: 'amount', unit: 'kg' },
  { id: 'employees', topic: 'scale', kind: 'amount', unit: 'people' },
  { id: 'consignment-value', topic: 'scale', kind: 'money' },
  { id: 'food-business-registered', topic: 'scale', kind: 'yesno' },
] as const satisfies readonly Question[];

export type QuestionId = (typeof QUESTIONS)[number]['id'];
