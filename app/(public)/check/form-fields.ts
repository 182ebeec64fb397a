const texts = (form: FormData, name: string): string[] => form.getAll(name).filter((value) => typeof value === 'string');

export type PlacesSent = {
  readonly key: string | null;
  readonly regions: string[];
  readonly saleOn: string | null;
  /** The answer of a note, "crazed:yes". */
  readonly fromNote: string | null;
};

/** The form of places and day, as it was sent. */
export function placesOf(form: FormData): PlacesSent {
  return {
    key: texts(form, 'key')[0] ?? null,
    regions: texts(form, 'region'),
    saleOn: texts(form, 'on')[0]?.trim() ?? null,
    fromNote: texts(form, 'with')[0] ?? null,
  };
}

/** A page of questions as it was sent. Next's own fields stay out. */
export function fieldsOf(form: FormData): { id: unknown; question: unknown; asked: string[]; fields: Record<string, string[]> } {
  const own = new Set(['id', 'question', 'asked']);
  const names = [...new Set(form.keys())].filter((name) => !own.has(name) && !name.startsWith('$ACTION'));
  return {
    id: form.get('id'),
    question: form.get('question'),
    asked: texts(form, 'asked'),
    fields: Object.fromEntries(names.map((name) => [name, texts(form, name)])),
  };
}
