import { questionWords } from '@/components/checks/question-words';
import { words, wordsAt } from '@/lib/kernel/words';
import type { SheetFault } from '@/lib/readings/domain/sheet-faults';

/** What is wrong and how to mend it, in one sentence: the same beside the field and in the summary. */
export function sheetFaultWords(fault: SheetFault): string {
  switch (fault.place) {
    case 'places':
    case 'day':
      return whyOf(fault);
    case 'piece':
      return words('readings-page.faults.named', { name: questionWords(fault.name ?? '', 'short'), why: whyOf(fault) });
    case 'profile':
      return profileFault(fault);
    case 'readings':
    case 'further':
      return rowFault(fault);
    case 'extract':
    case 'condition':
      return words('readings-page.faults.named', { name: wordsAt(`readings-page.name.${fault.name ?? ''}`) ?? '', why: whyOf(fault) });
  }
}

/** Why alone, for a place that says already which row it is. */
export function whyOf({ why, name = '', said = '' }: SheetFault): string {
  if (why === 'twice' || why === 'unknown-place') return words(`readings-page.faults.why.${why}`, { name });
  if (why === 'refused') return words('readings-page.faults.why.refused', { said });
  return wordsAt(`readings-page.faults.why.${why}`) ?? why;
}

const MOST_POINTS = 12;
const OF_THE_LINE = ['too-few-points', 'no-opening', 'bad-spill', 'spill-below-floor'] as const;
const OF_A_POINT = ['negative-radius', 'back-at-centre', 'crosses-itself', 'rim-not-highest'] as const;

function profileFault(fault: SheetFault): string {
  const { why, row: point } = fault;
  if (why === 'no-profile') return whyOf(fault);
  const line = OF_THE_LINE.find((kind) => kind === why);
  if (line !== undefined) return words(`measures.profile.fault.${line}`);
  if (why === 'too-many-points') return words('measures.profile.fault.too-many-points', { most: MOST_POINTS });
  const place = OF_A_POINT.find((kind) => kind === why);
  if (place !== undefined) return words(`measures.profile.fault.${place}`, { point: point ?? 1 });
  if (point === undefined) return words('readings-page.faults.named', { name: words('readings-page.profile.spill'), why: whyOf(fault) });
  return words('readings-page.faults.point', { point, why: whyOf(fault) });
}

function rowFault(fault: SheetFault): string {
  const { place, row, line } = fault;
  const why = whyOf(fault);
  const isFurther = place === 'further';
  if (line !== undefined) return words(isFurther ? 'readings-page.faults.furtherLine' : 'readings-page.faults.line', { line, why });
  if (row === undefined || fault.why === 'no-readings') return why;
  return words(isFurther ? 'readings-page.faults.furtherRow' : 'readings-page.faults.row', { row, why });
}
