import { tokensOf } from './index-words';
import { meaningsOf } from './lexicon';
import type { Sought } from './query';
import { readWords, type ReadWord } from './read-words';

/** A stretch of a sentence; `isMet` where it is what was sought. */
export type Stretch = { readonly text: string; readonly isMet: boolean };

const MOST_READ = 20_000;
const MOST_SENTENCES = 400;
/** A longer sentence is shown in part, from a few words before the first that was met. */
const LONGEST = 220;
const BEFORE = 60;

type Span = { readonly from: number; readonly to: number };
type Best = { readonly sentence: string; readonly spans: readonly Span[]; readonly met: number };

/** The sentence of a text that has most of what was sought, with the words that have it. The first one where none has any. */
export function matchedSentence(text: string, sought: readonly Sought[]): readonly Stretch[] {
  let best: Best = { sentence: '', spans: [], met: -1 };
  for (const sentence of sentencesIn(text)) {
    const found = metIn(sentence, sought);
    if (found.met > best.met) best = { sentence, ...found };
    if (best.met === sought.length) break;
  }
  return stretches(best.sentence, best.spans);
}

const sentencesIn = (text: string): readonly string[] =>
  text
    .slice(0, MOST_READ)
    .split(/\n+|(?<=[.!?])\s/)
    .slice(0, MOST_SENTENCES)
    .map((sentence) => sentence.trim())
    .filter((sentence) => sentence !== '');

function metIn(sentence: string, sought: readonly Sought[]): { readonly spans: readonly Span[]; readonly met: number } {
  const words = readWords(sentence);
  const runs = [...meaningsOf(words).map(({ from, to }) => words.slice(from, to)), ...words.map((word) => [word])];
  const met = runs.map((run) => ({ run, things: sought.filter((one) => isMetBy(run, one)) })).filter(({ things }) => things.length > 0);
  const spans = met.flatMap(({ run: [first, ...rest] }) =>
    first === undefined ? [] : [{ from: first.from, to: (rest.at(-1) ?? first).to }],
  );
  return { spans, met: new Set(met.flatMap(({ things }) => things)).size };
}

function isMetBy(run: readonly ReadWord[], { tokens, prefix }: Sought): boolean {
  const own = tokensOf(run);
  return own.some((token) => tokens.includes(token) || (prefix !== null && token.startsWith(prefix)));
}

function stretches(sentence: string, spans: readonly Span[]): readonly Stretch[] {
  const { start, end } = shownPart(sentence, Math.min(...spans.map(({ from }) => from), sentence.length));
  const parts: Stretch[] = [{ text: start > 0 ? '… ' : '', isMet: false }];
  let at = start;
  for (const { from, to } of spans.toSorted((a, b) => a.from - b.from || b.to - a.to)) {
    if (from < at || to > end) continue;
    parts.push({ text: sentence.slice(at, from), isMet: false }, { text: sentence.slice(from, to), isMet: true });
    at = to;
  }
  parts.push({ text: sentence.slice(at, end), isMet: false }, { text: end < sentence.length ? '…' : '', isMet: false });
  return parts.filter(({ text }) => text !== '');
}

/** All of a sentence, or of a long one the part about what was met first. */
function shownPart(sentence: string, first: number): { readonly start: number; readonly end: number } {
  const start = sentence.length <= LONGEST || first <= BEFORE ? 0 : startOfWord(sentence, first - BEFORE);
  return { start, end: sentence.length - start <= LONGEST ? sentence.length : startOfWord(sentence, start + LONGEST) };
}

const startOfWord = (sentence: string, near: number): number => {
  const space = sentence.indexOf(' ', near);
  return space === -1 ? near : space + 1;
};
