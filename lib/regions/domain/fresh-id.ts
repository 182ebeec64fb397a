type Wish = {
  readonly name: string;
  /** Put before it, as a rule's id begins with its place: "dk". */
  readonly prefix: string | null;
  readonly isTaken: (id: string) => boolean;
};

const LONGEST = 60;

/** An id out of a name, in lower case letters, digits and hyphens; with a number behind it when it is taken. */
export function freshId({ name, prefix, isTaken }: Wish): string {
  const plain = slugOf(name);
  const id = prefix === null || plain === prefix || plain.startsWith(`${prefix}-`) ? plain : joined(prefix, plain);
  const wish = id === '' ? 'new' : id;
  for (let number = 1; ; number += 1) {
    const tried = number === 1 ? wish : `${wish}-${String(number)}`;
    if (!isTaken(tried)) return tried;
  }
}

const joined = (prefix: string, rest: string): string => (rest === '' ? prefix : `${prefix}-${rest}`);

/** Letters of other scripts leave nothing; accents are taken off. */
function slugOf(name: string): string {
  const plain = name
    .normalize('NFKD')
    .toLowerCase()
    .replaceAll(/\p{M}/gu, '')
    .replaceAll('ø', 'o')
    .replaceAll('æ', 'ae')
    .replaceAll('ß', 'ss')
    .replaceAll(/[^a-z0-9]+/g, '-');
  return plain.slice(0, LONGEST).replaceAll(/^-+|-+$/g, '');
}
