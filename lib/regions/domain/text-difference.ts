import { diffArrays, diffWordsWithSpace } from 'diff';
import { LOCALE } from '@/lib/kernel/words';

/** A run of words that both versions have, or only one of them. */
export type WordPart = { readonly kind: 'kept' | 'added' | 'removed'; readonly text: string };

/** A paragraph, heading or list item. What moved stands twice: where it was (`moved-away`) and where it is (`moved`). */
export type Passage =
  | { readonly kind: 'kept' | 'added' | 'removed' | 'moved' | 'moved-away'; readonly text: string }
  | { readonly kind: 'changed'; readonly parts: readonly WordPart[] };

/** `layout`: the same words with other line breaks, blank lines or list marks. `too-long`: not compared, more than `MOST_CHARACTERS`. */
export type TextDifference =
  { readonly kind: 'same' | 'layout' | 'too-long' } | { readonly kind: 'changed'; readonly passages: readonly Passage[] };

/** Characters of either version. A sheet's text has some thousands. */
export const MOST_CHARACTERS = 60_000;
/** Beyond this many edits two lists are told as one taken out and one put in. */
const MOST_EDITS = 3000;
/** Share of words in common from which on two passages count as versions of each other. */
const ALIKE = 0.4;

/** Compares two Markdown texts by passages, within them by sentences, within these by words. */
export function textDifference(before: string, after: string): TextDifference {
  if (before === after) return { kind: 'same' };
  if (Math.max(before.length, after.length) > MOST_CHARACTERS) return { kind: 'too-long' };
  const [was, is] = [passagesIn(before), passagesIn(after)];
  const runs = runsOf(was, is);
  if (runs.every(({ kept }) => kept.length > 0)) return { kind: 'layout' };
  const moved = movedIn(runs);
  return { kind: 'changed', passages: runs.flatMap((run) => passagesOf(run, moved)) };
}

/** What one version reads, out of the difference: its passages with its own words alone. */
export function sideOf(passages: readonly Passage[], side: 'before' | 'after'): readonly Passage[] {
  const [own, moved] = side === 'before' ? (['removed', 'moved-away'] as const) : (['added', 'moved'] as const);
  return passages.flatMap((passage): readonly Passage[] => {
    if (passage.kind === 'changed') return [{ ...passage, parts: passage.parts.filter(({ kind }) => kind === 'kept' || kind === own) }];
    return passage.kind === 'kept' || passage.kind === own || passage.kind === moved ? [passage] : [];
  });
}

const STARTS = /^(#{1,6} |[-*+] |\d{1,9}[.)] |> |\|)/;

/** The passages of a Markdown text, each on one line whatever its layout was. */
export function passagesIn(text: string): readonly string[] {
  const passages: string[] = [];
  let open = false;
  for (const raw of text.split(/\r?\n/)) {
    const line = raw.trim().replaceAll(/\s+/g, ' ');
    const starts = !open || STARTS.test(line);
    open = line !== '' && !/^#{1,6} /.test(line);
    if (line === '') continue;
    if (starts) passages.push(line.replace(/^[*+] /, '- '));
    else passages.push(`${passages.pop() ?? ''} ${line}`);
  }
  return passages;
}

/** Neighbours that both versions have, or what stands in their place in each: `kept`, or the two others, are empty. */
type Run = Readonly<Record<WordPart['kind'], readonly string[]>>;

function runsOf(was: readonly string[], is: readonly string[]): readonly Run[] {
  const changes = diffArrays([...was], [...is], { maxEditLength: MOST_EDITS });
  if (changes === undefined) return [{ kept: [], removed: was, added: is }];
  const runs: Run[] = [];
  for (const { added, removed, value } of changes) {
    const kind = kindOf({ added, removed });
    const last = runs.at(-1);
    const goesOn = last !== undefined && last.kept.length > 0 === (kind === 'kept');
    const run = goesOn ? last : { kept: [], removed: [], added: [] };
    runs.splice(goesOn ? -1 : runs.length, 1, { ...run, [kind]: [...run[kind], ...value] });
  }
  return runs;
}

function kindOf({ added, removed }: { readonly added: boolean; readonly removed: boolean }): WordPart['kind'] {
  if (added) return 'added';
  return removed ? 'removed' : 'kept';
}

/** Passages taken out in one place and put in, word for word, in another. Of one that repeats, as many as moved. */
function movedIn(runs: readonly Run[]): ReadonlySet<string> {
  const removed = new Set(runs.flatMap((run) => run.removed));
  const counted = (list: readonly string[], text: string): number => list.filter((one) => one === text).length;
  const all = { removed: runs.flatMap((run) => run.removed), added: runs.flatMap((run) => run.added) };
  return new Set([...removed].filter((text) => counted(all.added, text) === counted(all.removed, text)));
}

function passagesOf({ kept, removed, added }: Run, moved: ReadonlySet<string>): readonly Passage[] {
  if (kept.length > 0) return kept.map((text) => ({ kind: 'kept', text }));
  // A moved passage keeps its place among the others of its run, so that each side reads in its own order.
  if ([...removed, ...added].some((text) => moved.has(text))) {
    return [
      ...removed.map((text): Passage => ({ kind: moved.has(text) ? 'moved-away' : 'removed', text })),
      ...added.map((text): Passage => ({ kind: moved.has(text) ? 'moved' : 'added', text })),
    ];
  }
  return pairs(removed, added).map(([was, is]): Passage =>
    was !== null && is !== null
      ? { kind: 'changed', parts: sentencesOf(was, is) }
      : { kind: was === null ? 'added' : 'removed', text: was ?? is ?? '' },
  );
}

type PairOf = readonly [was: string | null, is: string | null];

/** Versions of each other side by side, in the order of both lists; what has no counterpart stands alone. */
function pairs(was: readonly string[], is: readonly string[]): readonly PairOf[] {
  const found: PairOf[] = [];
  let next = 0;
  for (const later of is) {
    const place = was.findIndex((earlier, at) => at >= next && likeness(earlier, later) >= ALIKE);
    if (place === -1) {
      found.push([null, later]);
      continue;
    }
    found.push(...was.slice(next, place).map((earlier): PairOf => [earlier, null]), [was[place] ?? null, later]);
    next = place + 1;
  }
  return [...found, ...was.slice(next).map((earlier): PairOf => [earlier, null])];
}

function likeness(a: string, b: string): number {
  const [own, other] = [wordsIn(a), wordsIn(b)];
  const common = [...own].filter((word) => other.has(word)).length;
  return (2 * common) / Math.max(1, own.size + other.size);
}

const wordsIn = (text: string): ReadonlySet<string> => new Set(text.toLowerCase().match(/[\p{L}\p{N}]+/gu) ?? []);

const SENTENCES = new Intl.Segmenter(LOCALE, { granularity: 'sentence' });

function sentencesOf(was: string, is: string): readonly WordPart[] {
  const split = (text: string): readonly string[] => Array.from(SENTENCES.segment(text), ({ segment }) => segment);
  const parts = runsOf(split(was), split(is)).flatMap(({ kept, removed, added }): readonly WordPart[] => {
    if (kept.length > 0) return kept.map((text) => part('kept', text));
    return pairs(removed, added).flatMap(([earlier, later]) => wordParts(earlier ?? '', later ?? ''));
  });
  return joined(parts);
}

function wordParts(was: string, is: string): readonly WordPart[] {
  const changes = diffWordsWithSpace(was, is, { maxEditLength: MOST_EDITS });
  if (changes === undefined) return [part('removed', was), part('added', is)];
  return changes.map(({ added, removed, value }) => part(kindOf({ added, removed }), value));
}

const part = (kind: WordPart['kind'], text: string): WordPart => ({ kind, text });

type Side = Record<WordPart['kind'], string>;

/** Changes with nothing but a space between them become one: first all that went, then all that came. */
function joined(parts: readonly WordPart[]): readonly WordPart[] {
  const runs: Side[] = [];
  for (const { kind, text } of withoutBridges(parts)) {
    const last = runs.at(-1);
    const goesOn = last !== undefined && (last.kept !== '') === (kind === 'kept');
    const run = goesOn ? last : { kept: '', removed: '', added: '' };
    if (!goesOn) runs.push(run);
    run[kind] += text;
  }
  return runs.flatMap((run) => (['kept', 'removed', 'added'] as const).flatMap((kind) => (run[kind] === '' ? [] : part(kind, run[kind]))));
}

/** A space that both versions have between two changes goes and comes with them. */
function withoutBridges(parts: readonly WordPart[]): readonly WordPart[] {
  const changes = (place: number): boolean => (parts[place]?.kind ?? 'kept') !== 'kept';
  return parts.flatMap((one, place) => {
    const bridges = one.kind === 'kept' && one.text.trim() === '' && changes(place - 1) && changes(place + 1);
    return bridges ? [part('removed', one.text), part('added', one.text)] : [one];
  });
}
