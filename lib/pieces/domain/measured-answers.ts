import { brimfulMl } from './filling';
import { depthRuleOf, insideDepthMm } from './region-measures';
import type { Vessel } from './vessel';

/** Answers to the questions of measure. A question left out is not known. */
export type MeasuredAnswers = { readonly 'capacity-ml': number; readonly 'depth-mm'?: number };

/** To the sixth decimal, where amounts are compared: 34.1 − 9.1 is 25 there, as it is on the rule. */
const sixPlaces = (value: number): number => Number(value.toFixed(6));

/**
 * What a profile answers for a place: the brimful capacity, and the depth as that place takes it. Where the two ways of taking it
 * differ and we do not know which one counts, depth stays open. Nothing is concluded from the form.
 */
export function measuredAnswers(vessel: Vessel, line: readonly string[]): MeasuredAnswers {
  const capacity = { 'capacity-ml': sixPlaces(brimfulMl(vessel)) };
  const rule = depthRuleOf(line) ?? (vessel.rimMm === vessel.overflowMm ? 'rim-plane' : null);
  return rule === null ? capacity : { ...capacity, 'depth-mm': sixPlaces(insideDepthMm(vessel, rule)) };
}
