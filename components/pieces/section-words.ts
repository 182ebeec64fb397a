import { sayPhrases } from '@/lib/kernel/say';
import { words } from '@/lib/kernel/words';

/** What is known of a piece, by the questions' own names. Everything may be missing. */
export type PieceShape = {
  readonly form?: string | undefined;
  readonly depthMm?: number | undefined;
  readonly capacityMl?: number | undefined;
  readonly inside?: string | undefined;
  readonly crazed?: boolean | undefined;
  readonly rimDecorated?: boolean | undefined;
  readonly lidded?: boolean | undefined;
};

/** The words of a drawing: its title and text twin, and what stands beside its measures. */
export type SectionWords = {
  readonly title: string;
  readonly about: string;
  readonly unknown: string;
  readonly depth: { readonly name: string; readonly amount: string | null };
  readonly capacity: { readonly name: string; readonly amount: string | null };
  /** What each pattern that is drawn means, in words. */
  readonly key: readonly string[];
};

const FORMS = [
  ...(['plate', 'saucer', 'platter', 'bowl', 'mug', 'cup', 'tumbler', 'jug', 'creamer', 'teapot', 'coffee-pot', 'jar'] as const),
  ...(['bottle', 'baking-dish', 'casserole', 'spoon-rest', 'tile', 'vase', 'ornament', 'other'] as const),
];
const INSIDES = ['glazed', 'partly-glazed', 'unglazed'] as const;

const sayForm = (form: string | undefined): string => words(`pieces.form.${FORMS.find((known) => known === form) ?? 'unknown'}`);

const sayAmount = (value: number | undefined, unit: 'mm' | 'ml'): string | null =>
  value === undefined ? null : words(`pieces.section.${unit}`, { value });

function sayInside(inside: string | undefined): string | null {
  const known = INSIDES.find((one) => one === inside);
  return known === undefined ? null : words(`pieces.section.inside.${known}`);
}

const given = (phrases: readonly (string | null)[]): readonly string[] => phrases.filter((phrase) => phrase !== null);

const sentence = (phrases: readonly string[]): string => {
  const said = sayPhrases(phrases);
  return said === '' ? '' : `${said.charAt(0).toUpperCase()}${said.slice(1)}.`;
};

/** "Bowl, 62 mm deep inside, inside unglazed", and the rest of what the drawing shows. */
export function sectionWords(piece: PieceShape): SectionWords {
  const depth = sayAmount(piece.depthMm, 'mm');
  const capacity = sayAmount(piece.capacityMl, 'ml');
  const more = given([
    capacity === null ? null : words('pieces.section.holds', { capacity }),
    piece.crazed === true ? words('pieces.section.crazed') : null,
    piece.rimDecorated === true ? words('pieces.section.rim') : null,
    piece.lidded === true ? words('pieces.section.lidded') : null,
  ]);
  return {
    title: sayPhrases(
      given([sayForm(piece.form), depth === null ? null : words('pieces.section.deep', { depth }), sayInside(piece.inside)]),
    ),
    about: `${words('pieces.section.about')} ${sentence(more)}`.trim(),
    unknown: words('pieces.section.unknown'),
    depth: { name: words('pieces.section.depth'), amount: depth },
    capacity: { name: words('pieces.section.capacity'), amount: capacity },
    key: keyOf(piece),
  };
}

function keyOf({ inside, crazed, rimDecorated }: PieceShape): readonly string[] {
  return given([
    words('pieces.section.key.clay'),
    words('pieces.section.key.surface'),
    inside === 'unglazed' || inside === 'partly-glazed' ? words('pieces.section.key.dots') : null,
    crazed === true && inside !== 'unglazed' ? words('pieces.section.key.net') : null,
    rimDecorated === true ? words('pieces.section.key.hatch') : null,
  ]);
}
