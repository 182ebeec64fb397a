/** An entry of the word list. */
export type WordEntry = {
  readonly slug: string;
  readonly name: string;
  readonly definition: string;
  /** Other words for the same thing, by language. */
  readonly also: Readonly<Record<string, readonly string[]>>;
  /** Slugs of related entries. */
  readonly see: readonly string[];
};

const initial = ({ name }: WordEntry): string => name.normalize('NFD').charAt(0).toUpperCase();

/** The list by first letters, in the order of the alphabet. */
export function byLetter(entries: readonly WordEntry[]): readonly { readonly letter: string; readonly entries: readonly WordEntry[] }[] {
  const order = entries.toSorted((one, other) => one.name.localeCompare(other.name, 'en'));
  const letters = [...new Set(order.map(initial))];
  return letters.map((letter) => ({ letter, entries: order.filter((entry) => initial(entry) === letter) }));
}
