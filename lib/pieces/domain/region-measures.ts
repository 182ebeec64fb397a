import { heightAlongRim, capacityToMl, meniscusAreaMm2, tracedRimAreaMm2 } from './filling';
import type { Vessel } from './vessel';

/** Up to where the inside depth is taken: the plane of the upper rim, or the point where it overflows. */
export type DepthRule = 'rim-plane' | 'overflow';

export type Evidence = 'read' | 'memory';

/** How far below the point of overflow a lab fills, and how far along a flat or gently sloping rim where the source allows that. */
export type FillRule = {
  readonly leastBelowMm: number;
  readonly mostBelowMm: number;
  readonly alongRimMm: number | null;
  readonly evidence: Evidence;
  readonly source: string;
};

const DEPTH_RULES: Readonly<Record<string, DepthRule>> = {
  eu: 'rim-plane',
  gb: 'rim-plane',
  'gb-nir': 'rim-plane',
  us: 'rim-plane',
  cn: 'rim-plane',
  ca: 'overflow',
  jp: 'overflow', // "depth when filled"
  'iso-6486': 'overflow',
};

const BY_DIRECTIVE: FillRule = {
  leastBelowMm: 1,
  mostBelowMm: 1,
  alongRimMm: 6,
  evidence: 'read',
  source: 'Council Directive 84/500/EEC, Annex I(3.1)',
};

const FILL_RULES: Readonly<Record<string, FillRule>> = {
  eu: BY_DIRECTIVE,
  gb: { ...BY_DIRECTIVE, source: 'WSI 2012/2705, Schedule 3, which fills as Directive 84/500/EEC does' },
  ca: { leastBelowMm: 5, mostBelowMm: 5, alongRimMm: null, evidence: 'read', source: 'SOR/2016-175, Schedule, s. 1' },
  us: {
    leastBelowMm: 6,
    mostBelowMm: 7,
    alongRimMm: null,
    evidence: 'read',
    source: 'US FDA, Elemental Analysis Manual, section 4.6, draft 0.2 (2010)',
  },
  'iso-6486': {
    leastBelowMm: 5,
    mostBelowMm: 5,
    alongRimMm: null,
    evidence: 'read',
    source: 'ISO 6486-1 as restated in SOR/2016-175, Schedule, s. 1',
  },
};

/** The most local layer of a region line that says something; null where none does. */
function mostLocal<T>(rules: Readonly<Record<string, T>>, line: readonly string[]): T | null {
  const named = line.findLast((code) => Object.hasOwn(rules, code));
  return named === undefined ? null : (rules[named] ?? null);
}

/** How depth is taken in a place, by its region line from general to local. Null where we read nothing about it. */
export const depthRuleOf = (line: readonly string[]): DepthRule | null => mostLocal(DEPTH_RULES, line);

/** How high a lab fills in a place, by its region line from general to local. Null where we read nothing about it. */
export const fillRuleOf = (line: readonly string[]): FillRule | null => mostLocal(FILL_RULES, line);

/** From the lowest inside point, wherever it lies: a raised centre takes nothing off the depth. */
export function insideDepthMm({ lowestMm, rimMm, overflowMm }: Vessel, rule: DepthRule): number {
  return (rule === 'rim-plane' ? rimMm : overflowMm) - lowestMm;
}

/** Filled to a level: its height, and what the piece then holds. */
export type Filled = { readonly levelMm: number; readonly capacityMl: number };

/** The levels a source allows. Null where the piece is too shallow to leave so much room. */
export type FillLevels = {
  readonly highest: Filled | null;
  readonly lowest: Filled | null;
  /** For a flat or gently sloping rim only. Whether it is one, the maker has to say: the source draws no line. */
  readonly alongRim: Filled | null;
};

/** Filled so many millimetres below the point of overflow, measured upright; null when that is at or below the floor. */
export function filledBelow(vessel: Vessel, belowMm: number): Filled | null {
  return filledAt(vessel, vessel.overflowMm - belowMm);
}

function filledAt(vessel: Vessel, levelMm: number | null): Filled | null {
  if (levelMm === null || levelMm <= vessel.lowestMm) return null;
  return { levelMm, capacityMl: capacityToMl(vessel, levelMm) };
}

/** Filled as a region's method says. */
export function fillLevels(vessel: Vessel, rule: FillRule): FillLevels {
  return {
    highest: filledBelow(vessel, rule.leastBelowMm),
    lowest: filledBelow(vessel, rule.mostBelowMm),
    alongRim: rule.alongRimMm === null ? null : filledAt(vessel, heightAlongRim(vessel, rule.alongRimMm)),
  };
}

/** Square millimetres in one square decimetre. */
const MM2 = 10_000;

/** The area a result per dm² of flat ware is divided by. Null where there is no free liquid surface. */
export type ReferenceAreas = {
  /** EU: the free surface of the liquid, filled 1 mm below overflow or 6 mm along a flat or gently sloping rim. */
  readonly meniscusDm2: number | null;
  readonly meniscusAlongRimDm2: number | null;
  /** ISO 6486-1: the outline of the rim. On a wide sloping rim it is larger than the liquid's surface. */
  readonly tracedRimDm2: number;
};

/** The reference areas of a piece of flat ware. A piece that cannot be filled has only its traced rim. */
export function referenceAreas(vessel: Vessel): ReferenceAreas {
  const { highest, alongRim } = fillLevels(vessel, BY_DIRECTIVE);
  const surface = (filled: Filled | null): number | null => (filled === null ? null : meniscusAreaMm2(vessel, filled.levelMm) / MM2);
  return { meniscusDm2: surface(highest), meniscusAlongRimDm2: surface(alongRim), tracedRimDm2: tracedRimAreaMm2(vessel) / MM2 };
}
