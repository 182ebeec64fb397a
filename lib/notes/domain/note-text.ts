/** The running text of a note: as a reader reads it, as sentences, and the figures in it. */

const CITATION_TAG = /<(?:Fact|Rule)\b[^>]*\/>/g;
const OTHER_TAG = /<\/?[A-Z][A-Za-z]*\b[^>]*\/?>/g;
const LINK = /\[([^\]]*)\]\([^)]*\)/g;

const isTableRule = (line: string): boolean => /^\|[\s:|-]+\|$/.test(line.trim());

/** A body without its tags, links and marks; one line a paragraph, list item or table row. Citations leave no trace. */
export function plainLines(body: string): readonly string[] {
  return blocksOf(body)
    .map((block) => withoutMarks(block.replace(CITATION_TAG, '').replace(OTHER_TAG, '')))
    .filter((line) => line !== '');
}

/** The same as one text, for search. */
export const plainText = (body: string): string => plainLines(body).join('\n');

const withoutMarks = (block: string): string =>
  block
    .replace(LINK, '$1')
    .replace(/^(?:#{1,6}|[-*]|\d+\.)\s+/, '')
    .replace(/\*\*|(?<!\w)\*|\*(?!\w)/g, '')
    .replace(/\s*\|\s*/g, ' | ')
    .replace(/^ \| | \| $/g, '')
    .replace(/\s+([.,;:?!])/g, '$1')
    .replace(/\s+/g, ' ')
    .trim();

/** Paragraphs, list items, rows of tables, headings: what stands by itself. */
function blocksOf(body: string): readonly string[] {
  const blocks: string[][] = [[]];
  for (const line of body.split('\n')) {
    const opens = /^\s*(?:#{1,6}\s|[-*]\s|\d+\.\s|\||<)/.test(line);
    if (line.trim() === '' || opens) blocks.push([]);
    if (!isTableRule(line)) blocks.at(-1)?.push(line);
  }
  return blocks.map((lines) => lines.join(' ').trim()).filter((block) => block !== '');
}

const SENTENCE_END = /(?<=[.?!:]["”]?)\s+(?=["“A-ZÀ-Þ0-9*[<])/u;

/** The sentences of running text, without headings and tables. */
export function sentencesOf(body: string): readonly string[] {
  return blocksOf(body)
    .filter((block) => !/^(?:#|\||<(?:Figures|Check|Drawing|Caution))/.test(block))
    .flatMap((block) => withoutMarks(block.replace(CITATION_TAG, '').replace(OTHER_TAG, '')).split(SENTENCE_END))
    .map((sentence) => sentence.trim())
    .filter((sentence) => sentence !== '');
}

export const wordCount = (text: string): number => text.split(/\s+/u).filter((word) => /[\p{L}\p{N}]/u.test(word)).length;

const UNIT = [
  '°C|°F|%|percent|ppm|ppb|mg|µg|micrograms?|milligrams?|g|kg|mm|cm|inches|mL|L|litres?|dm²|cm²|m²|kPa|psi',
  'h|hours?|minutes?|days?|weeks?|months?|years?|pieces|mugs|leachings|samples|DKK|EUR|US dollars',
].join('|');
/** A figure with its unit, in either order where the unit is a currency. */
const FIGURE = new RegExp(String.raw`(?:\d[\d.,]*\s?(?:${UNIT})(?![\p{L}])|(?:DKK|EUR|CAD|USD)\s\d)`, 'u');
const ENDS = /(?<=[.?!](?:\s*<[^>]*\/>)*)\s+(?=["“A-Z*[])/u;

/** Sentences and table cells that hold a figure with its unit and no citation. Headings and links only name what they lead to. */
export function figuresWithoutSource(body: string): readonly string[] {
  return blocksOf(body)
    .filter((block) => !/^(?:#|<Figures)/.test(block))
    .flatMap((block) => (block.startsWith('|') ? cellsOf(block) : block.split(ENDS)))
    .filter((part) => FIGURE.test(part.replace(LINK, '')) && !/<(?:Fact|Rule)\b/.test(part));
}

/** Each cell is asked by itself: a row compares figures of several sources. The first one names the row. */
const cellsOf = (row: string): readonly string[] => row.split('|').slice(2);

/** Whether a text holds a figure with its unit. */
export const hasFigure = (text: string): boolean => FIGURE.test(text);
