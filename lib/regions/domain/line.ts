import type { CalendarDate } from '@/lib/kernel/calendar-date';
import { isInForce } from './rule';
import type { Membership } from './sheet';

/** Memberships by place, in the order the editors fixed. A place that is part of nothing need not stand here. */
export type Memberships = ReadonlyMap<string, readonly Membership[]>;

/** How a place is read on a day: its layers from general to local, itself last, and the inherited rules that are not active in it. */
export type RegionLine = {
  readonly layers: readonly string[];
  readonly except: readonly { readonly rule: string; readonly why: string }[];
};

/**
 * The region line of a place on a day. The dated membership edges decide, so that places join and leave blocs.
 * A circle of memberships is cut where it closes; each layer stands once, where it is met first.
 */
export function regionLine(memberships: Memberships, code: string, on: CalendarDate): RegionLine {
  const layers: string[] = [];
  const except = new Map<string, string>();
  const walk = (place: string, above: readonly string[]): void => {
    if (above.includes(place) || layers.includes(place)) return;
    for (const edge of memberships.get(place) ?? []) {
      if (!isInForce(edge, on)) continue;
      walk(edge.parent, [...above, place]);
      for (const { rule, why } of edge.except) except.set(rule, why);
    }
    layers.push(place);
  };
  walk(code, []);
  return { layers, except: [...except].map(([rule, why]) => ({ rule, why })) };
}
