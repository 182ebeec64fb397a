/** The form of readings as it was sent: its address, and what each field held. Next's own fields stay out. */
export function sheetOf(form: FormData): { readonly id: unknown; readonly fields: Readonly<Record<string, readonly string[]>> } {
  const names = [...new Set(form.keys())].filter((name) => name !== 'key' && !name.startsWith('$ACTION'));
  const fields = names.flatMap((name) => {
    const values = form.getAll(name).filter((value) => typeof value === 'string');
    // Most fields of most sheets are empty; empty and absent are read alike.
    return values.some((value) => value !== '') ? [[name, values] as const] : [];
  });
  return { id: form.get('key'), fields: Object.fromEntries(fields) };
}
