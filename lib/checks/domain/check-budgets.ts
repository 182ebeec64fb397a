import type { CalendarDate } from '@/lib/kernel/calendar-date';
import type { Sheet } from '@/lib/regions/domain/sheet';
import { placeOfId } from './check-names';
import type { BothLines } from './compiled-days';
import { fault, type Finding } from './finding';
import { MOST_CELLS, MOST_NODES, MOST_QUESTIONS, type CompileFault } from './line-input';

/** C10, and what else keeps the place's own line from being compiled on one of the days. */
export function checkCompiling(proposed: Sheet, { after }: BothLines, days: readonly CalendarDate[]): readonly Finding[] {
  return days.flatMap((on) => {
    const line = after.compiled(proposed.code, on);
    return line.ok ? [] : [findingOfFault(proposed, line.error, on)];
  });
}

function findingOfFault(sheet: Sheet, { kind, in: id, about = '' }: CompileFault, on: CalendarDate): Finding {
  const at = placeOfId(sheet, id, kind === 'attack-on-firm' || kind === 'attack-not-downwards' ? 'targets' : 'when');
  switch (kind) {
    case 'too-many-cells':
      return fault('C10', { at, kind, values: { question: about, most: Math.floor((MOST_CELLS - 1) / 2) } });
    case 'too-many-questions':
      return fault('C10', { at, kind, values: { most: MOST_QUESTIONS } });
    case 'too-many-nodes':
      return fault('C10', { at, kind, values: { most: MOST_NODES } });
    case 'unknown-term':
      return fault('C1', { at, kind: 'term-not-in-force', values: { term: about, on } });
    case 'term-cycle':
      return fault('C1', { at, kind });
    case 'unknown-question':
    case 'bad-test':
      return fault('C1', { at, kind, values: { question: about } });
    case 'attack-not-downwards':
      return fault('C2', { at, kind: 'attack-upwards', values: { target: about } });
    case 'attack-on-firm':
      return fault('C2', { at, kind, values: { target: about } });
  }
}

/** Lines of places below that compile today and would no longer; the sheet they stumble over cannot be mended in this proposal. */
export function checkBelow(proposed: Sheet, { before, after }: BothLines, code: string, days: readonly CalendarDate[]): readonly Finding[] {
  return days.flatMap((on): readonly Finding[] => {
    const line = after.compiled(code, on);
    if (line.ok || !before.compiled(code, on).ok) return [];
    const { kind, in: id, about = '' } = line.error;
    const at = placeOfId(proposed, about === '' ? id : about, 'id');
    return [fault('C1', { at, kind: 'breaks-below', values: { region: code, rule: id, about, why: kind, on } })];
  });
}
